namespace IceExtent.Worker.Commands;

/// <summary>Carries what an option's own check found through the parser's message, which is a plain text.</summary>
internal static class OptionCheck
{
    /// <summary>Stands between option, found and allowed; no command line holds it.</summary>
    public const char Separator = '\u001f';

    /// <summary>A message that <see cref="CommandLine"/> turns into a fault.</summary>
    public static string Message(string option, string found, string allowed) => string.Join(Separator, option, found, allowed);
}
