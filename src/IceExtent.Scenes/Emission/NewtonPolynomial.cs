using System.Numerics;

namespace IceExtent.Scenes.Emission;

/// <summary>A smooth function of one variable as a polynomial through eight Chebyshev points, in Newton's form.</summary>
internal sealed class NewtonPolynomial
{
    private const int Points = 8;

    private readonly float[] nodes = new float[Points];
    private readonly float[] factors = new float[Points];
    private readonly float middle;
    private readonly float inverseHalf;

    private NewtonPolynomial(double lowest, double highest)
    {
        middle = (float)((lowest + highest) / 2.0);
        inverseHalf = (float)(2.0 / (highest - lowest));
    }

    /// <summary>Fits a polynomial to a function between two ends.</summary>
    public static NewtonPolynomial Fit(Func<double, double> function, double lowest, double highest)
    {
        NewtonPolynomial fit = new(lowest, highest);
        double[] x = new double[Points];
        double[] differences = new double[Points];
        for (int index = 0; index < Points; index++)
        {
            x[index] = Math.Cos(Math.PI * (index + 0.5) / Points);
            differences[index] = function(((lowest + highest) / 2.0) + (x[index] * (highest - lowest) / 2.0));
        }

        for (int order = 1; order < Points; order++)
        {
            for (int index = Points - 1; index >= order; index--)
            {
                differences[index] = (differences[index] - differences[index - 1]) / (x[index] - x[index - order]);
            }
        }

        for (int index = 0; index < Points; index++)
        {
            (fit.nodes[index], fit.factors[index]) = ((float)x[index], (float)differences[index]);
        }

        return fit;
    }

    /// <summary>The polynomial at a few places.</summary>
    public Vector<float> At(Vector<float> place)
    {
        Vector<float> x = (place - new Vector<float>(middle)) * new Vector<float>(inverseHalf);
        Vector<float> sum = new(factors[Points - 1]);
        for (int index = Points - 2; index >= 0; index--)
        {
            sum = (sum * (x - new Vector<float>(nodes[index]))) + new Vector<float>(factors[index]);
        }

        return sum;
    }
}
