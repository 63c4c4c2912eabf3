using System.Buffers;
using System.Numerics;

namespace IceExtent.Retrieval;

/// <summary>The standard error that footprints wider than a cell give where concentration changes from cell to cell.</summary>
/// <remarks>
/// σ² = σ_scatter² + (K · (highest − lowest concentration of the 3 × 3 cells))². Source of the form: [Tonboe2016],
/// [Lavergne2019]; K is the run's, from config. Missing neighbours are passed over; a cell alone gets nothing.
/// </remarks>
public static class EdgeSmearing
{
    /// <summary>Widens the standard errors of a whole plane.</summary>
    /// <param name="totalFraction">Clipped concentrations; NaN is missing. Shape: rows × <paramref name="columns"/>, row-major.</param>
    /// <param name="columns">The number of columns.</param>
    /// <param name="factor">K, without unit; 0 changes nothing.</param>
    /// <param name="standardErrorFraction">Changed in place; NaN stays.</param>
    /// <exception cref="ArgumentException">The planes differ in length or are no whole number of rows.</exception>
    public static void Apply(ReadOnlySpan<float> totalFraction, int columns, double factor, Span<float> standardErrorFraction)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(columns, 1);
        if (standardErrorFraction.Length != totalFraction.Length || totalFraction.Length % columns != 0)
        {
            throw new ArgumentException("Both planes must hold the same whole number of rows.", nameof(standardErrorFraction));
        }

        if (factor == 0.0)
        {
            return;
        }

        // Highest and lowest of three rows, with a column of nothing at either side.
        int width = columns + 2;
        float[] scratch = ArrayPool<float>.Shared.Rent(2 * width);
        Span<float> highest = scratch.AsSpan(0, width);
        Span<float> lowest = scratch.AsSpan(width, width);
        int rows = totalFraction.Length / columns;
        for (int row = 0; row < rows; row++)
        {
            highest.Fill(float.NegativeInfinity);
            lowest.Fill(float.PositiveInfinity);
            for (int from = Math.Max(0, row - 1); from <= Math.Min(rows - 1, row + 1); from++)
            {
                Gather(totalFraction.Slice(from * columns, columns), highest[1..^1], lowest[1..^1]);
            }

            Widen(highest, lowest, (float)factor, standardErrorFraction.Slice(row * columns, columns));
        }

        ArrayPool<float>.Shared.Return(scratch);
    }

    private static void Gather(ReadOnlySpan<float> fractions, Span<float> highest, Span<float> lowest)
    {
        int cell = 0;
        for (; cell <= fractions.Length - Vector<float>.Count; cell += Vector<float>.Count)
        {
            Vector<float> value = new(fractions[cell..]);
            Vector<float> high = new(highest[cell..]);
            Vector<float> low = new(lowest[cell..]);
            Vector.ConditionalSelect(Vector.GreaterThan(value, high), value, high).CopyTo(highest[cell..]); // NaN is never greater.
            Vector.ConditionalSelect(Vector.LessThan(value, low), value, low).CopyTo(lowest[cell..]);
        }

        for (; cell < fractions.Length; cell++)
        {
            highest[cell] = fractions[cell] > highest[cell] ? fractions[cell] : highest[cell];
            lowest[cell] = fractions[cell] < lowest[cell] ? fractions[cell] : lowest[cell];
        }
    }

    private static void Widen(ReadOnlySpan<float> highest, ReadOnlySpan<float> lowest, float factor, Span<float> errors)
    {
        int cell = 0;
        for (; cell <= errors.Length - Vector<float>.Count; cell += Vector<float>.Count)
        {
            Vector<float> high = Vector.Max(Vector.Max(new Vector<float>(highest[cell..]), new Vector<float>(highest[(cell + 1)..])), new Vector<float>(highest[(cell + 2)..]));
            Vector<float> low = Vector.Min(Vector.Min(new Vector<float>(lowest[cell..]), new Vector<float>(lowest[(cell + 1)..])), new Vector<float>(lowest[(cell + 2)..]));
            Vector<float> error = new(errors[cell..]);
            Vector<float> smearing = (high - low) * factor;
            Vector.SquareRoot((error * error) + (smearing * smearing)).CopyTo(errors[cell..]); // NaN in, NaN out.
        }

        for (; cell < errors.Length; cell++)
        {
            float high = MathF.Max(MathF.Max(highest[cell], highest[cell + 1]), highest[cell + 2]);
            float low = MathF.Min(MathF.Min(lowest[cell], lowest[cell + 1]), lowest[cell + 2]);
            float smearing = (high - low) * factor;
            errors[cell] = MathF.Sqrt((errors[cell] * errors[cell]) + (smearing * smearing));
        }
    }
}
