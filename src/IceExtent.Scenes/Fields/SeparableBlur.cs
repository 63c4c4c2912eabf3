namespace IceExtent.Scenes.Fields;

/// <summary>Smears a plane with a Gaussian, first along rows and then along columns.</summary>
/// <remarks>Beyond the edge of the grid the outermost cell is repeated. The weights add up to 1.</remarks>
internal sealed class SeparableBlur
{
    private readonly float[] weights;
    private readonly int reach;

    /// <summary>Sets the smearing up.</summary>
    /// <param name="standardDeviationCells">Of the Gaussian, in cells; 0 leaves planes as they are.</param>
    public SeparableBlur(double standardDeviationCells)
    {
        reach = (int)Math.Ceiling(3.0 * standardDeviationCells);
        double[] bell = new double[(2 * reach) + 1];
        double sum = 0.0;
        for (int tap = 0; tap < bell.Length; tap++)
        {
            double distance = reach == 0 ? 0.0 : (tap - reach) / standardDeviationCells;
            bell[tap] = Math.Exp(-0.5 * distance * distance);
            sum += bell[tap];
        }

        weights = Array.ConvertAll(bell, value => (float)(value / sum));
    }

    /// <summary>Smears one plane into another.</summary>
    /// <param name="from">One value a cell, row-major, none missing.</param>
    /// <param name="columns">The number of columns of the grid.</param>
    /// <param name="room">At least as long as <paramref name="from"/> plus one row on either side; overwritten.</param>
    /// <param name="into">Receives one value a cell; may be the same memory as <paramref name="from"/>.</param>
    public void Smear(ReadOnlySpan<float> from, int columns, Span<float> room, Span<float> into)
    {
        int rows = from.Length / columns;
        Span<float> padded = stackalloc float[columns + (2 * reach)];
        for (int row = 0; row < rows; row++)
        {
            ReadOnlySpan<float> source = from.Slice(row * columns, columns);
            padded[..reach].Fill(source[0]);
            source.CopyTo(padded[reach..]);
            padded[(reach + columns)..].Fill(source[^1]);
            Span<float> target = room.Slice(row * columns, columns);
            PlaneMath.WriteScaled(target, padded, weights[0]);
            for (int tap = 1; tap < weights.Length; tap++)
            {
                PlaneMath.AddScaled(target, padded[tap..], weights[tap]);
            }
        }

        for (int row = 0; row < rows; row++)
        {
            Span<float> target = into.Slice(row * columns, columns);
            for (int tap = 0; tap < weights.Length; tap++)
            {
                ReadOnlySpan<float> source = room.Slice(Math.Clamp(row + tap - reach, 0, rows - 1) * columns, columns);
                if (tap == 0)
                {
                    PlaneMath.WriteScaled(target, source, weights[0]);
                }
                else
                {
                    PlaneMath.AddScaled(target, source, weights[tap]);
                }
            }
        }
    }
}
