using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearAlgebra.Factorization;

namespace IceExtent.Retrieval;

/// <summary>The direction of the line of closed ice in a space of channels.</summary>
internal static class IceDirection
{
    /// <summary>The first principal axis of the samples, or the direction between the fixed ice surfaces where the samples lie in one heap.</summary>
    /// <param name="ice">Samples of closed ice.</param>
    /// <param name="channels">The axes of the space.</param>
    /// <param name="fixedAxis">From multiyear to first-year ice, in K; of any length.</param>
    /// <param name="leastElongation">See <see cref="TuningRules.LeastElongation"/>.</param>
    /// <returns>A unit vector that points the same way as the fixed one.</returns>
    /// <remarks>Source: [Lavergne2019] for the principal axis; the rule for one heap is our own.</remarks>
    public static double[] Of(SurfaceMoments ice, IReadOnlyList<Channel> channels, IReadOnlyList<double> fixedAxis, double leastElongation)
    {
        Matrix<double> covariance = Matrix<double>.Build.Dense(
            channels.Count, channels.Count, (row, column) => ice.Covariance(channels[row], channels[column]));
        Evd<double> axes = covariance.Evd(Symmetricity.Symmetric); // Variances in rising order.
        double along = axes.EigenValues[^1].Real;
        double across = axes.EigenValues[^2].Real;
        Vector<double> expected = Vector<double>.Build.DenseOfEnumerable(fixedAxis).Normalize(2.0);
        if (!(along >= leastElongation * leastElongation * Math.Max(across, 0.0)) || along <= 0.0)
        {
            return expected.ToArray();
        }

        Vector<double> found = axes.EigenVectors.Column(channels.Count - 1).Normalize(2.0);
        return (found.DotProduct(expected) < 0.0 ? found.Negate() : found).ToArray();
    }
}
