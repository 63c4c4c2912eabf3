using System.Buffers;
using System.Numerics;
using System.Runtime.CompilerServices;

namespace IceExtent.Retrieval;

/// <summary>How much concentrations that change from cell to cell widen standard errors. Without unit; 0 leaves a term out.</summary>
/// <param name="Range">K: per unit of the range among a cell and its eight neighbours.</param>
/// <param name="Curvature">B: per unit of what the mean of the neighbours differs from the cell.</param>
public sealed record SmearingFactors(double Range, double Curvature)
{
    /// <summary>Nothing is widened.</summary>
    public static SmearingFactors None { get; } = new(0.0, 0.0);
}

/// <summary>The standard error that footprints wider than a cell give where concentration changes from cell to cell.</summary>
/// <remarks>
/// σ² = σ_scatter² + (K · (highest − lowest concentration of the 3 × 3 cells))² + (B · (mean of the neighbours − the cell))². Source
/// of the first form: [Tonboe2016], [Lavergne2019]. The second is our own: to first order a footprint adds half its variance times the
/// curvature of the field, which leads and small floes have without a large range. Missing neighbours are passed over; a cell alone
/// gets nothing.
/// </remarks>
public static class EdgeSmearing
{
    /// <summary>Widens the standard errors of a whole plane.</summary>
    /// <param name="totalFraction">Clipped concentrations; NaN is missing. Shape: rows × <paramref name="columns"/>, row-major.</param>
    /// <param name="columns">The number of columns.</param>
    /// <param name="factors">K and B.</param>
    /// <param name="standardErrorFraction">Changed in place; NaN stays.</param>
    /// <exception cref="ArgumentException">The planes differ in length or are no whole number of rows.</exception>
    public static void Apply(ReadOnlySpan<float> totalFraction, int columns, SmearingFactors factors, Span<float> standardErrorFraction)
    {
        ArgumentNullException.ThrowIfNull(factors);
        ArgumentOutOfRangeException.ThrowIfLessThan(columns, 1);
        if (standardErrorFraction.Length != totalFraction.Length || totalFraction.Length % columns != 0)
        {
            throw new ArgumentException("Both planes must hold the same whole number of rows.", nameof(standardErrorFraction));
        }

        if (factors is { Range: 0.0, Curvature: 0.0 })
        {
            return;
        }

        // What three rows hold, with a column of nothing at either side.
        int width = columns + 2;
        float[] scratch = ArrayPool<float>.Shared.Rent(4 * width);
        Rows three = new(scratch.AsSpan(0, width), scratch.AsSpan(width, width), scratch.AsSpan(2 * width, width), scratch.AsSpan(3 * width, width));
        int rows = totalFraction.Length / columns;
        for (int row = 0; row < rows; row++)
        {
            three.Clear();
            for (int from = Math.Max(0, row - 1); from <= Math.Min(rows - 1, row + 1); from++)
            {
                three.Add(totalFraction.Slice(from * columns, columns));
            }

            three.Widen(totalFraction.Slice(row * columns, columns), factors, standardErrorFraction.Slice(row * columns, columns));
        }

        ArrayPool<float>.Shared.Return(scratch);
    }

    private readonly ref struct Rows(Span<float> highest, Span<float> lowest, Span<float> sum, Span<float> count)
    {
        private readonly Span<float> highest = highest;
        private readonly Span<float> lowest = lowest;
        private readonly Span<float> sum = sum;
        private readonly Span<float> count = count;

        public void Clear()
        {
            highest.Fill(float.NegativeInfinity);
            lowest.Fill(float.PositiveInfinity);
            sum.Clear();
            count.Clear();
        }

        [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
        public void Add(ReadOnlySpan<float> fractions)
        {
            int cell = 0;
            for (; cell <= fractions.Length - Vector<float>.Count; cell += Vector<float>.Count)
            {
                Add(new Vector<float>(fractions[cell..]), cell + 1);
            }

            for (; cell < fractions.Length; cell++)
            {
                float value = fractions[cell];
                if (!float.IsNaN(value))
                {
                    highest[cell + 1] = MathF.Max(value, highest[cell + 1]);
                    lowest[cell + 1] = MathF.Min(value, lowest[cell + 1]);
                    sum[cell + 1] += value;
                    count[cell + 1]++;
                }
            }
        }

        [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
        public void Widen(ReadOnlySpan<float> fractions, SmearingFactors factors, Span<float> errors)
        {
            (Vector<float> range, Vector<float> curvature) = (new((float)factors.Range), new((float)factors.Curvature));
            int cell = 0;
            for (; cell <= errors.Length - Vector<float>.Count; cell += Vector<float>.Count)
            {
                Vector<float> high = Vector.Max(Vector.Max(At(highest, cell), At(highest, cell + 1)), At(highest, cell + 2));
                Vector<float> low = Vector.Min(Vector.Min(At(lowest, cell), At(lowest, cell + 1)), At(lowest, cell + 2));
                Vector<float> all = At(sum, cell) + At(sum, cell + 1) + At(sum, cell + 2);
                Vector<float> held = At(count, cell) + At(count, cell + 1) + At(count, cell + 2);
                Widened(At(errors, cell), At(fractions, cell), (high - low) * range, (all, held), curvature).CopyTo(errors[cell..]);
            }

            for (; cell < errors.Length; cell++)
            {
                float high = MathF.Max(MathF.Max(highest[cell], highest[cell + 1]), highest[cell + 2]);
                float low = MathF.Min(MathF.Min(lowest[cell], lowest[cell + 1]), lowest[cell + 2]);
                float all = sum[cell] + sum[cell + 1] + sum[cell + 2];
                float held = count[cell] + count[cell + 1] + count[cell + 2];
                errors[cell] = Widened(new(errors[cell]), new(fractions[cell]), new Vector<float>(high - low) * range, (new(all), new(held)), curvature)[0];
            }
        }

        // NaN in the error or in the cell gives NaN.
        private static Vector<float> Widened(
            Vector<float> error, Vector<float> fraction, Vector<float> spread, (Vector<float> Sum, Vector<float> Count) box, Vector<float> curvature)
        {
            Vector<float> neighbours = Vector.Max(box.Count - Vector<float>.One, Vector<float>.One);
            Vector<float> apart = (box.Sum - (fraction * box.Count)) / neighbours * curvature; // Mean of the others less the cell.
            return Vector.SquareRoot((error * error) + (spread * spread) + (apart * apart));
        }

        private static Vector<float> At(ReadOnlySpan<float> plane, int cell) => new(plane[cell..]);

        private void Add(Vector<float> value, int at)
        {
            Vector<float> high = new(highest[at..]);
            Vector<float> low = new(lowest[at..]);
            Vector<int> there = Vector.Equals(value, value);
            Vector.ConditionalSelect(Vector.GreaterThan(value, high), value, high).CopyTo(highest[at..]); // NaN is never greater.
            Vector.ConditionalSelect(Vector.LessThan(value, low), value, low).CopyTo(lowest[at..]);
            (new Vector<float>(sum[at..]) + Vector.ConditionalSelect(there, value, Vector<float>.Zero)).CopyTo(sum[at..]);
            (new Vector<float>(count[at..]) + Vector.ConditionalSelect(there, Vector<float>.One, Vector<float>.Zero)).CopyTo(count[at..]);
        }
    }
}
