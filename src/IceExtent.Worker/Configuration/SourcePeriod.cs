namespace IceExtent.Worker.Configuration;

/// <summary>The days that a source may rule, as the run file says, inside its sensor's service. Both ends belong to it.</summary>
/// <param name="First">The first day, or null for the whole service up to <paramref name="Last"/>.</param>
/// <param name="Last">The last day, or null for the whole service from <paramref name="First"/> on.</param>
internal readonly record struct SourcePeriod(DateOnly? First, DateOnly? Last)
{
    public bool Holds(DateOnly day) => (First is not { } first || day >= first) && (Last is not { } last || day <= last);
}
