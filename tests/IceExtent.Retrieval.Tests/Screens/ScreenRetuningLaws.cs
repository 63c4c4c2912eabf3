using CsCheck;

namespace IceExtent.Retrieval.Tests.Screens;

/// <summary>What a retuned limit must do whatever the surfaces.</summary>
public sealed class ScreenRetuningLaws
{
    private static readonly Gen<(double V19, double V37)> Water = Gen.Select(Gen.Double[165, 195], Gen.Double[1.08, 1.16], (v19, slope) => (v19, v19 * slope));
    private static readonly Gen<(double V19, double V37)> Ice = Gen.Select(Gen.Double[200, 260], Gen.Double[0.80, 1.02], (v19, slope) => (v19, v19 * slope));

    /// <summary>No linear mixture with more ice than the fraction, of whatever kinds of ice, is set to open water by the screen itself.</summary>
    [Fact]
    public void Limit_MixtureWithMoreIce_IsNeverRemoved() =>
        Gen.Select(Water, Ice, Ice, Gen.Double[0.02, 0.4], Gen.Double[0, 1], Gen.Double[0, 1]).Sample((water, first, multi, fraction, excess, share) =>
        {
            double limit = Limit(water, fraction, first, multi);
            double ice = fraction + (excess * (1.0 - fraction));
            return !Removes(limit, Mix(water, Mix(first, multi, share), ice));
        });

    /// <summary>The limit is as low as it can be: a little less ice of the one kind that holds it up is removed.</summary>
    [Fact]
    public void Limit_LessIceOfTheRulingKind_IsRemoved() =>
        Gen.Select(Water, Ice, Ice, Gen.Double[0.02, 0.4]).Sample((water, first, multi, fraction) =>
        {
            double limit = Limit(water, fraction, first, multi);
            return Removes(limit, Mix(water, first, fraction - 0.01)) || Removes(limit, Mix(water, multi, fraction - 0.01));
        });

    /// <summary>More ice that may go never raises the limit, and one more kind of ice never lowers it.</summary>
    [Fact]
    public void Limit_FractionRaisedOrIceAdded_MovesOneWay() =>
        Gen.Select(Water, Ice, Ice, Gen.Double[0.02, 0.2], Gen.Double[0.2, 0.4]).Sample((water, first, multi, low, high) =>
            Limit(water, high, first, multi) <= Limit(water, low, first, multi) && Limit(water, low, first, multi) >= Limit(water, low, first));

    private static double Limit((double V19, double V37) water, double fraction, params (double V19, double V37)[] ice) =>
        ScreenRetuning.Limit(Channel.V37, Kelvins(water), [.. ice.Select(Kelvins)], fraction)!.Value;

    private static bool Removes(double limit, (double V19, double V37) cell)
    {
        float[] total = [0.5f];
        return GradientScreen.Apply([(float)cell.V37], [(float)cell.V19], limit, CellConditions.WeatherGradient3719, total, new CellConditions[1]) == 1;
    }

    private static (double V19, double V37) Mix((double V19, double V37) one, (double V19, double V37) other, double share) =>
        (((1.0 - share) * one.V19) + (share * other.V19), ((1.0 - share) * one.V37) + (share * other.V37));

    private static ChannelKelvins Kelvins((double V19, double V37) point) =>
        new(new Dictionary<Channel, double> { [Channel.V19] = point.V19, [Channel.V37] = point.V37 });
}
