using IceExtent.Statistics.Seasons;

namespace IceExtent.Statistics.Tests.Seasons;

/// <summary>A daily series of one ice year, written as values from given days on.</summary>
/// <remarks>Days count from the year's first day; before it the first value holds.</remarks>
internal sealed class IceSeries
{
    private readonly IceYearSpan span;

    public IceSeries(IceYearSpan span, params (int From, double Fraction)[] steps)
    {
        this.span = span;
        Fractions = new float[span.Days];
        Errors = new float[span.Days];
        for (int index = 0; index < Fractions.Length; index++)
        {
            int day = index - span.Lead;
            (int From, double Fraction) step = steps[0];
            foreach ((int From, double Fraction) next in steps)
            {
                step = next.From <= day ? next : step;
            }

            Fractions[index] = day >= span.RecordFirst && day <= span.RecordLast ? (float)step.Fraction : float.NaN;
        }
    }

    public float[] Fractions { get; }

    public float[] Errors { get; }

    /// <summary>Takes days away.</summary>
    public IceSeries Without(int first, int last)
    {
        Array.Fill(Fractions, float.NaN, first + span.Lead, last - first + 1);
        Array.Fill(Errors, float.NaN, first + span.Lead, last - first + 1);
        return this;
    }

    /// <summary>Sets the standard error of every day.</summary>
    public IceSeries WithError(double error)
    {
        Array.Fill(Errors, (float)error);
        return this;
    }

    public IceDates Find(SeasonScheme scheme) => new SeasonFinder(scheme, span).Find(Fractions, Errors);
}
