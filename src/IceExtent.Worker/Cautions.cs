namespace IceExtent.Worker;

/// <summary>What everyone who reads a number must know.</summary>
internal static class Cautions
{
    public const string Text =
        "Satellite estimates at this resolution are no basis for navigation or for going on ice. "
        + "Follow the national ice service, local knowledge, local rules and licensed practice.";
}
