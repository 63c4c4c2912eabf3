using CsCheck;

namespace IceExtent.Retrieval.Tests.Tuning;

/// <summary>What holds for the projections of self-tuning, whatever the samples.</summary>
public sealed class SelfTuningLaws
{
    private static readonly Gen<DaySamples> Days = Gen.Select(Gen.Int[1, 100_000], Gen.Double[0.3, 4.0], Gen.Double[0.0, 0.6])
        .Select((seed, noise, multi) => PureDays.Day(seed, 300, 300, 0.0, noise, multi));

    /// <summary>No angle of 360 scatters less over either surface than the closed solution.</summary>
    [Fact]
    public void Find_AnySamples_NoScannedAngleDoesBetter() => Days.Sample(day =>
    {
        double[] line = Line(day);
        LinearForm best = LeastScatterAxis.Find(day.OpenWater, day.OpenWater.Center, day.ClosedIce.Center, line)!;
        double least = day.OpenWater.VarianceOf(best);
        return Enumerable.Range(0, 360).Select(angle => Scanned(day, line, angle / 360.0 * Math.PI))
            .Where(form => form is not null)
            .All(form => day.OpenWater.VarianceOf(form!) >= least * (1.0 - 1e-4)); // The floor under variances shifts the optimum by so much.
    }, iter: 50);

    /// <summary>The centres are 0 and 1, and a step along the ice line changes nothing.</summary>
    [Fact]
    public void Find_AnySamples_CentresAreNoneAndAll() => Days.Sample(day =>
    {
        double[] line = Line(day);
        LinearForm form = LeastScatterAxis.Find(day.ClosedIce, day.OpenWater.Center, day.ClosedIce.Center, line)!;
        double along = LeastScatterAxis.Space.Select((channel, axis) => form.WeightOf(channel) * line[axis]).Sum();
        return Math.Abs(form.At(day.OpenWater.Center)) < 1e-9 && Math.Abs(form.At(day.ClosedIce.Center) - 1.0) < 1e-9 && Math.Abs(along) < 1e-9;
    });

    /// <summary>The fast blend is the plain one.</summary>
    [Fact]
    public void Retrieve_AnyPixels_AgreesWithThePlainTwin() =>
        Gen.Select(Gen.Double[150, 280], Gen.Double[150, 280], Gen.Double[100, 270]).Array[1, 40].Sample(pixels =>
        {
            TunedDay tuned = MovingTiePoints.Tune(PureDays.Own, [.. Enumerable.Range(1, 4).Select(seed => PureDays.Day(seed))], PureDays.Rules);
            SelfTuning method = SelfTuning.From(tuned.Tuning.Surfaces!, tuned.Tuning.Samples, PureDays.Rules.Blend);
            BrightnessPlanes observed = new(pixels.Length, method.Channels);
            for (int cell = 0; cell < pixels.Length; cell++)
            {
                observed.Kelvins(Channel.V19)[cell] = (float)pixels[cell].Item1;
                observed.Kelvins(Channel.V37)[cell] = (float)pixels[cell].Item2;
                observed.Kelvins(Channel.H37)[cell] = (float)pixels[cell].Item3;
            }

            ConcentrationPlanes into = new(pixels.Length);
            method.Retrieve(observed, new(0, pixels.Length), into);
            return Enumerable.Range(0, pixels.Length).All(cell =>
            {
                double open = method.OverWater.At(channel => observed.Kelvins(channel)[cell]);
                double share = method.ShareOverIce(open);
                double plain = ((1.0 - share) * open) + (share * method.OverIce.At(channel => observed.Kelvins(channel)[cell]));
                return plain is < -1.0 or > 2.0 || Math.Abs(into.Total[cell] - plain) <= 3e-5; // The blend is five times as steep as a projection.
            }) && into.Multiyear.ToArray().All(float.IsNaN);
        }, iter: 30);

    /// <summary>Water on the ice line: no projection, so the fixed pair stands, and mixtures of the fixed surfaces come back.</summary>
    [Fact]
    public void From_WaterOnTheIceLine_FallsBackToTheFixedPair()
    {
        DaySamples day = PureDays.Day(7);
        PureSamples samples = new(day.ClosedIce, day.ClosedIce, Line(day), PureDays.Rules.Blend);

        SelfTuning method = SelfTuning.From(PureDays.Own.Surfaces!, samples, PureDays.Rules.Blend);

        Assert.Equal(0.0, method.OverWater.At(PureDays.Own.Surfaces!.OpenWater), 1e-9);
        Assert.Equal(1.0, method.OverIce.At(PureDays.Own.Surfaces!.Multiyear), 1e-9);
    }

    private static double[] Line(DaySamples day)
    {
        TunedDay tuned = MovingTiePoints.Tune(PureDays.Own, [day], PureDays.Rules with { LeastDays = 1 });
        return [.. tuned.Tuning.Samples!.IceDirection];
    }

    // A projection at right angles to the line, turned by an angle; null where it sees no contrast.
    private static LinearForm? Scanned(DaySamples day, double[] line, double angle)
    {
        double[] first = Cross(line, Math.Abs(line[0]) < 0.9 ? [1.0, 0.0, 0.0] : [0.0, 1.0, 0.0]);
        double length = Math.Sqrt(first.Sum(value => value * value));
        first = Array.ConvertAll(first, value => value / length);
        double[] second = Cross(line, first);
        double[] axis = [.. first.Zip(second, (a, b) => (Math.Cos(angle) * a) + (Math.Sin(angle) * b))];
        double contrast = LeastScatterAxis.Space.Select((channel, index) => axis[index] * (day.ClosedIce.MeanKelvins(channel) - day.OpenWater.MeanKelvins(channel))).Sum();
        return Math.Abs(contrast) < 1e-3 ? null : new(0.0, [.. LeastScatterAxis.Space.Select((channel, index) => (channel, axis[index] / contrast))]);
    }

    private static double[] Cross(double[] a, double[] b) =>
        [(a[1] * b[2]) - (a[2] * b[1]), (a[2] * b[0]) - (a[0] * b[2]), (a[0] * b[1]) - (a[1] * b[0])];
}
