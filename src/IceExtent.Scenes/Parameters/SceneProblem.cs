namespace IceExtent.Scenes.Parameters;

/// <summary>One value of a scene that cannot be used.</summary>
/// <param name="Key">Its key in the file, such as <c>season.melt_exponent</c>.</param>
/// <param name="Found">What stands there.</param>
/// <param name="Allowed">What would have been accepted, with its unit.</param>
public sealed record SceneProblem(string Key, string Found, string Allowed)
{
    /// <inheritdoc/>
    public override string ToString() => $"{Key}: found {Found}; allowed: {Allowed}.";
}
