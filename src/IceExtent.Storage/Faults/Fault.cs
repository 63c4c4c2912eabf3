namespace IceExtent.Storage.Faults;

/// <summary>One thing that is wrong, where it is, and what to do about it.</summary>
/// <param name="Code">The stable code, such as <c>IE2104</c>; each has a heading in docs/ERRORS.md.</param>
/// <param name="Where">A file, a position in it, a key or a folder.</param>
/// <param name="Found">What was found, with units.</param>
/// <param name="Allowed">What would have been accepted, with units.</param>
/// <param name="Remedy">What the person can do next: a full sentence.</param>
public sealed record Fault(string Code, string Where, string Found, string Allowed, string Remedy)
{
    /// <summary>The fault as people read it.</summary>
    public override string ToString() => $"{Code} {Where}: found {Found}; allowed: {Allowed}. {Remedy}";
}
