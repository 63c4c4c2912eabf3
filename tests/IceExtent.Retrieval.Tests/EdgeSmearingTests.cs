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

        EdgeSmearing.Apply(total, 4, new(0.5, 0.0), error);

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
            EdgeSmearing.Apply(values, 37, new(0.3, 1.5), errors);
            return Enumerable.Range(0, values.Length).All(cell =>
            {
                float[] box = [.. Enumerable.Range(0, values.Length).Where(other =>
                    Math.Abs((other / 37) - (cell / 37)) <= 1 && Math.Abs((other % 37) - (cell % 37)) <= 1 && !float.IsNaN(values[other])).Select(other => values[other])];
                double neighbours = box.Length > 1 ? (box.Sum(value => (double)value) - values[cell]) / (box.Length - 1) : values[cell];
                double expected = Math.Sqrt((0.05 * 0.05) + Math.Pow(0.3 * (box.Max() - box.Min()), 2) + Math.Pow(1.5 * (neighbours - values[cell]), 2));
                return float.IsNaN(values[cell]) ? float.IsNaN(errors[cell]) : Math.Abs(errors[cell] - expected) < 2e-6;
            });
        });

    /// <summary>
    /// Origin: worked. A lead of 0.6 in ice of 0.9, three by three: neighbours' mean 0.9, so sqrt(0.03² + (1.5 · 0.3)²) = 0.450999; a
    /// corner has three neighbours of mean (0.9 + 0.9 + 0.6) / 3 = 0.8, so sqrt(0.03² + (1.5 · 0.1)²) = 0.152971.
    /// </summary>
    [Fact]
    public void Apply_Lead_IsWidenedByItsCurvature()
    {
        float[] total = [0.9f, 0.9f, 0.9f, 0.9f, 0.6f, 0.9f, 0.9f, 0.9f, 0.9f];
        float[] error = [.. Enumerable.Repeat(0.03f, 9)];

        EdgeSmearing.Apply(total, 3, new(0.0, 1.5), error);

        Assert.Equal(0.450999f, error[4], 1e-6f);
        Assert.Equal(0.152971f, error[0], 1e-6f);
    }

    /// <summary>A cell without any neighbour gets nothing.</summary>
    [Fact]
    public void Apply_CellAlone_StaysAsItIs()
    {
        float[] error = [0.05f];

        EdgeSmearing.Apply([0.5f], 1, new(0.3, 1.5), error);

        Assert.Equal(0.05f, error[0], 1e-7f);
    }

    [Fact]
    public void Apply_FactorOfZero_ChangesNothing()
    {
        float[] errors = [0.05f, 0.06f];

        EdgeSmearing.Apply([0f, 1f], 2, SmearingFactors.None, errors);

        Assert.Equal([0.05f, 0.06f], errors);
    }
}
