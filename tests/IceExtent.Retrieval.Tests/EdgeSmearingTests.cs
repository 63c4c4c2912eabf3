using CsCheck;
using IceExtent.Retrieval;

namespace IceExtent.Retrieval.Tests;

/// <summary>Standard errors beside steps in concentration.</summary>
public sealed class EdgeSmearingTests
{
    /// <summary>
    /// Origin: worked. Rows 0 0 1 1 over 0 0 NaN 1, K = 0.5, scatter 0.03: column 0 sees only 0 and keeps 0.03; the others
    /// see 0 and 1, so sqrt(0.03² + 0.5²) = 0.500899.
    /// </summary>
    [Fact]
    public void Apply_WorkedStep_WidensWhereBothSidesAreSeen()
    {
        float[] total = [0f, 0f, 1f, 1f, 0f, 0f, float.NaN, 1f];
        float[] error = [0.03f, 0.03f, 0.03f, 0.03f, 0.03f, 0.03f, float.NaN, 0.03f];

        EdgeSmearing.Apply(total, 4, 0.5, error);

        const float Wide = 0.500899f;
        Assert.Equal(0.03f, error[0], 1e-6f);
        Assert.Equal(Wide, error[1], 1e-6f);
        Assert.Equal(Wide, error[2], 1e-6f);
        Assert.Equal(0.03f, error[3], 1e-6f); // Its only observed neighbours hold 1.
        Assert.True(float.IsNaN(error[6]));
        Assert.Equal(0.03f, error[7], 1e-6f);
    }

    /// <summary>The vector loop and the tail do what the definition says, cell by cell, with holes.</summary>
    [Fact]
    public void Apply_AnyPlane_DoesWhatTheDefinitionSays() =>
        Gen.Select(Gen.Single[0, 1].Array[3 * 37], Gen.Int[0, 110]).Sample((values, hole) =>
        {
            values[hole] = float.NaN;
            float[] errors = Array.ConvertAll(values, value => float.IsNaN(value) ? float.NaN : 0.05f);
            EdgeSmearing.Apply(values, 37, 0.3, errors);
            return Enumerable.Range(0, values.Length).All(cell =>
            {
                float[] box = [.. Enumerable.Range(0, values.Length).Where(other =>
                    Math.Abs((other / 37) - (cell / 37)) <= 1 && Math.Abs((other % 37) - (cell % 37)) <= 1 && !float.IsNaN(values[other])).Select(other => values[other])];
                double expected = Math.Sqrt((0.05 * 0.05) + Math.Pow(0.3 * (box.Max() - box.Min()), 2));
                return float.IsNaN(values[cell]) ? float.IsNaN(errors[cell]) : Math.Abs(errors[cell] - expected) < 1e-6;
            });
        });

    [Fact]
    public void Apply_FactorOfZero_ChangesNothing()
    {
        float[] errors = [0.05f, 0.06f];

        EdgeSmearing.Apply([0f, 1f], 2, 0.0, errors);

        Assert.Equal([0.05f, 0.06f], errors);
    }
}
