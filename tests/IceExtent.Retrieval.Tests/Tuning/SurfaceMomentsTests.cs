using CsCheck;
using MathNet.Numerics.Statistics;

namespace IceExtent.Retrieval.Tests.Tuning;

/// <summary>Counts, centres and covariances of samples.</summary>
public sealed class SurfaceMomentsTests
{
    private static readonly Gen<(float V19, float V37)[]> Cells = Gen.Select(Gen.Single[150f, 280f], Gen.Single[150f, 280f]).Array[2, 60];

    /// <summary>Origin: worked. 180 and 190 K: centre 185, variance 50; with 210 and 200 K: covariance −50.</summary>
    [Fact]
    public void Of_TwoCells_GivesCentreAndCovariance()
    {
        SurfaceMoments moments = SurfaceMoments.Of(Planes([(180f, 210f), (190f, 200f)]), [0, 1]);

        Assert.Equal(2, moments.Count);
        Assert.Equal(185.0, moments.MeanKelvins(Channel.V19));
        Assert.Equal(50.0, moments.Covariance(Channel.V19, Channel.V19));
        Assert.Equal(-50.0, moments.Covariance(Channel.V37, Channel.V19));
        Assert.Equal(205.0, moments.Center[Channel.V37]);
        Assert.Equal(200.0, moments.VarianceOf(new(7.0, (Channel.V19, 1.0), (Channel.V37, -1.0))), 1e-9); // 50 + 50 + 2 · 50.
        Assert.Throws<ArgumentException>(() => moments.MeanKelvins(Channel.H89));
    }

    [Fact]
    public void Of_NoCell_HasNoCentre() =>
        Assert.Throws<InvalidOperationException>(() => SurfaceMoments.Of(Planes([(180f, 210f)]), []).Center);

    /// <summary>Origin: independent, MathNet.Numerics.</summary>
    [Fact]
    public void Of_AnyCells_AgreesWithTheLibrary() => Cells.Sample(cells =>
    {
        SurfaceMoments moments = SurfaceMoments.Of(Planes(cells), [.. Enumerable.Range(0, cells.Length)]);
        double[] v19 = [.. cells.Select(cell => (double)cell.V19)];
        double[] v37 = [.. cells.Select(cell => (double)cell.V37)];
        return Math.Abs(moments.MeanKelvins(Channel.V19) - v19.Mean()) < 1e-9
            && Math.Abs(moments.Covariance(Channel.V19, Channel.V37) - v19.Covariance(v37)) < 1e-7
            && Math.Abs(moments.Covariance(Channel.V37, Channel.V37) - v37.Variance()) < 1e-7;
    });

    /// <summary>Cut in three days, one of which may be empty, and joined: the same as all at once.</summary>
    [Fact]
    public void Merge_AnyCuts_IsTheSameAsAllAtOnce() => Gen.Select(Cells, Gen.Int[0, 60], Gen.Int[0, 60]).Sample((cells, a, b) =>
    {
        int[] all = [.. Enumerable.Range(0, cells.Length)];
        (int low, int high) = (Math.Min(Math.Min(a, b), cells.Length), Math.Min(Math.Max(a, b), cells.Length));
        BrightnessPlanes planes = Planes(cells);
        SurfaceMoments whole = SurfaceMoments.Of(planes, all);
        SurfaceMoments joined = SurfaceMoments.Merge([SurfaceMoments.Of(planes, all.AsSpan(0, low)), SurfaceMoments.Of(planes, all.AsSpan(low, high - low)), SurfaceMoments.Of(planes, all.AsSpan(high))]);
        return joined.Count == whole.Count
            && Math.Abs(joined.MeanKelvins(Channel.V37) - whole.MeanKelvins(Channel.V37)) < 1e-9
            && Math.Abs(joined.Covariance(Channel.V19, Channel.V37) - whole.Covariance(Channel.V19, Channel.V37)) < 1e-7;
    });

    [Fact]
    public void Merge_NothingOrOtherChannels_IsRefused()
    {
        BrightnessPlanes other = new(1, [Channel.H19]);
        other.Kelvins(Channel.H19)[0] = 100f;

        Assert.Throws<ArgumentException>(() => SurfaceMoments.Merge([]));
        Assert.Throws<ArgumentException>(() => SurfaceMoments.Merge([SurfaceMoments.Of(Planes([(180f, 210f)]), [0]), SurfaceMoments.Of(other, [0])]));
    }

    private static BrightnessPlanes Planes((float V19, float V37)[] cells)
    {
        BrightnessPlanes planes = new(cells.Length, [Channel.V19, Channel.V37]);
        for (int cell = 0; cell < cells.Length; cell++)
        {
            (planes.Kelvins(Channel.V19)[cell], planes.Kelvins(Channel.V37)[cell]) = cells[cell];
        }

        return planes;
    }
}
