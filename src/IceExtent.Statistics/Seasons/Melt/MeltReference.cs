namespace IceExtent.Statistics.Seasons;

/// <summary>How the frozen cell looks: mean and scatter of its indicators over a winter, ready for the sum of z-scores.</summary>
internal readonly record struct MeltReference(MeltReference.Scaled Jump, MeltReference.Scaled Gradient, MeltReference.Scaled Level, MeltReference.Scaled HorizontalRange)
{
    /// <summary>What the factors leave to be added.</summary>
    public float Shift => (float)(Jump.Shift + Gradient.Shift + Level.Shift + HorizontalRange.Shift);

    /// <summary>Measures a winter, or null with too few usable days.</summary>
    /// <param name="winter">Its days.</param>
    /// <param name="rules">Weights and least scatter.</param>
    /// <param name="room">The indicators, as <see cref="MeltIndicators.Fill"/> wrote them.</param>
    public static MeltReference? Measure(SearchSpan winter, MeltIndicatorRules rules, MeltWorkspace room)
    {
        int count = 0;
        Moments jump = default, gradient = default, level = default, range = default;
        for (int at = MeltIndicators.Pad + winter.First; at <= MeltIndicators.Pad + winter.Last; at++)
        {
            if (float.IsNaN(room.Usable[at]))
            {
                continue;
            }

            count++;
            jump.Add(room.Count[at]);
            gradient.Add(room.High[at]);
            level.Add(room.Low[at]);
            range.Add(room.Range[at]);
        }

        return count < rules.LeastWinterDays ? null : new(
            jump.Scale(count, rules.Jump, 1.0),
            gradient.Scale(count, rules.Gradient, 1.0),
            level.Scale(count, rules.Level, 1.0),
            range.Scale(count, rules.HorizontalRange, -1.0));
    }

    /// <summary>One indicator's part of the sum: value times factor, and shift.</summary>
    internal readonly record struct Scaled(float Factor, double Shift);

    private struct Moments
    {
        private double first;
        private double sum;
        private double squares;
        private bool begun;

        // About the first value, so that little is lost.
        public void Add(double value)
        {
            first = begun ? first : value;
            begun = true;
            sum += value - first;
            squares += (value - first) * (value - first);
        }

        public readonly Scaled Scale(int count, MeltIndicator indicator, double sign)
        {
            double mean = sum / count;
            double scatter = Math.Sqrt(Math.Max(0.0, (squares - (count * mean * mean)) / (count - 1)));
            double factor = sign * indicator.Weight / Math.Max(scatter, indicator.LeastScatter);
            return new((float)factor, -factor * (first + mean));
        }
    }
}
