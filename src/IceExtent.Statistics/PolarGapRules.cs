namespace IceExtent.Statistics;

/// <summary>The names of the rules in configuration files and what they say in the metadata of outputs.</summary>
public static class PolarGapRules
{
    private static readonly (PolarGapRule Rule, string Name, string Meaning)[] Known =
    [
        (PolarGapRule.CountAsIce, "count-as-ice", "counted as ice for extent, left out of area, marginal zone and pack"),
        (PolarGapRule.LeaveOut, "leave-out", "left out of extent, area, marginal zone and pack"),
        (PolarGapRule.Laplace, "laplace", "filled by Laplace's equation from its rim and counted like other cells; days with too little of the rim as count-as-ice"),
    ];

    /// <summary>The names, in the order of the rules.</summary>
    public static IReadOnlyList<string> Names { get; } = [.. Known.Select(known => known.Name)];

    /// <summary>The rule that has a name.</summary>
    /// <exception cref="InvalidOperationException">None has it.</exception>
    public static PolarGapRule Of(string name) => Known.First(known => known.Name == name).Rule;

    /// <summary>A rule's name and meaning, for metadata.</summary>
    public static string TextOf(PolarGapRule rule) => Known.Where(known => known.Rule == rule).Select(known => $"{known.Name}: {known.Meaning}").First();
}
