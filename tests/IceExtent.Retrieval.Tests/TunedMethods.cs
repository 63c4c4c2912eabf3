using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Retrieval.Tests;

/// <summary>Every method with one set of pure surfaces, and mixtures of them in all channels.</summary>
/// <remarks>The surfaces are those of F13 north (value from memory, high); 37H and 89 GHz are invented, of the usual size.</remarks>
internal static class TunedMethods
{
    private static readonly SurfacePoints Surfaces = new(
        LinearMethodTests.Point(185.2, 205.2, 149.4), LinearMethodTests.Point(251.2, 241.1, 229.7), LinearMethodTests.Point(222.4, 186.2, 175.7));

    /// <summary>Method and hemisphere; a method with no other tuning in the south stands there too.</summary>
    public static TheoryData<string, Hemisphere> All()
    {
        TheoryData<string, Hemisphere> all = [];
        foreach (string name in ConcentrationMethods.Names)
        {
            all.Add(name, Hemisphere.North);
            all.Add(name, Hemisphere.South);
        }

        return all;
    }

    public static ChannelNoise Noise { get; } = new(new Dictionary<Channel, double>
    {
        [Channel.V19] = 0.45, [Channel.H19] = 0.42, [Channel.V22] = 0.74, [Channel.V37] = 0.37, [Channel.H37] = 0.38, [Channel.V89] = 0.69, [Channel.H89] = 0.73,
    });

    public static IConcentrationMethod Create(string name, Hemisphere hemisphere) =>
        ConcentrationMethods.Create(name, new(TiePointSets.F13North, new(0.05, null), Surfaces, new(47.0, 11.7)), hemisphere);

    /// <summary>Where single and double precision may choose differently: a thousandth of a kelvin from Bootstrap's choice, as near to a corner of self-tuning.</summary>
    public static bool NearTheChoice(IConcentrationMethod method, ChannelKelvins surface) => method switch
    {
        Bootstrap bootstrap => Math.Abs(bootstrap.PolarizationMode.AboveLine.At(surface) + Bootstrap.ClosedIceMarginKelvins) < 1e-3,
        SelfTuning blend => Math.Min(
            Math.Abs(blend.OverWater.At(surface) - ProjectionBlend.Whole.From), Math.Abs(blend.OverWater.At(surface) - ProjectionBlend.Whole.To)) < 1e-4,
        _ => false,
    };

    /// <summary>A linear mixture.</summary>
    public static ChannelKelvins Mixture(double firstYear, double multiyear)
    {
        (double v19, double h19, double v37) = TiePointSets.Mix(TiePointSets.F13North, firstYear, multiyear);
        double water = 1.0 - firstYear - multiyear;
        double h37 = (water * 149.4) + (firstYear * 229.7) + (multiyear * 175.7);
        double h89 = 190.0 + (20.0 * (firstYear + multiyear));
        return new(new Dictionary<Channel, double>
        {
            [Channel.V19] = v19, [Channel.H19] = h19, [Channel.V22] = v19 + 8.0, [Channel.V37] = v37, [Channel.H37] = h37,
            [Channel.V89] = h89 + 11.7 + (35.3 * water), [Channel.H89] = h89,
        });
    }

    /// <summary>One channel moved.</summary>
    public static ChannelKelvins Moved(ChannelKelvins surface, Channel channel, double byKelvins) =>
        new(ChannelNames.All.ToDictionary(each => each, each => surface[each] + (each == channel ? byKelvins : 0.0)));

    /// <summary>Planes of all channels that hold one surface a cell.</summary>
    public static BrightnessPlanes Planes(params IReadOnlyList<ChannelKelvins> surfaces)
    {
        BrightnessPlanes planes = new(surfaces.Count, ChannelNames.All);
        foreach (Channel channel in ChannelNames.All)
        {
            for (int cell = 0; cell < surfaces.Count; cell++)
            {
                planes.Kelvins(channel)[cell] = (float)surfaces[cell][channel];
            }
        }

        return planes;
    }

    /// <summary>The unclipped totals.</summary>
    public static float[] Totals(IConcentrationMethod method, BrightnessPlanes observed)
    {
        ConcentrationPlanes into = new(observed.CellCount);
        method.Retrieve(observed, new(0, observed.CellCount), into);
        return into.Total.ToArray();
    }

    /// <summary>The noise variance of every cell.</summary>
    public static float[] Variances(IConcentrationMethod method, BrightnessPlanes observed, ChannelNoise noise)
    {
        float[] variances = new float[observed.CellCount];
        method.WriteNoiseVariance(observed, new(0, observed.CellCount), noise, variances);
        return variances;
    }
}
