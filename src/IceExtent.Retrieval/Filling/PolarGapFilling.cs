namespace IceExtent.Retrieval;

/// <summary>Fills the polar gap of one day after another. Holds working memory: not shared between threads.</summary>
/// <remarks>
/// Only rim cells seen in their place count, on the day or on days near it: as the solution is linear in the rim, a gap whose
/// rim was interpolated in time is the interpolated gap. Where a rim cell is empty, nothing flows through its side (the natural condition),
/// which takes that side out of the matrix. With A the matrix of the whole rim, E the affected border cells and D their
/// lost sides, (A − E·D·Eᵀ)·u = b has its border values from the small system (1 − D½·G·D½)·y = D½·(A⁻¹·b), where G is A⁻¹
/// between border cells and y = D½·u; then A·u = b + E·D½·y. So one factor serves every day, and the answer is exact
/// but for rounding: no iteration, no tolerance. A day is filled only where enough of every piece's rim was observed.
/// </remarks>
public sealed class PolarGapFilling
{
    private readonly PolarGapSystem system;
    private readonly double leastRimShare;
    private readonly double[] values;
    private readonly double[] multiyears;
    private readonly double[] borderSums;
    private readonly double[] small;
    private readonly double[] smallValues;
    private readonly int[] lostSides;
    private readonly int[] broken;
    private readonly int[] observedSides;

    /// <summary>Makes the working memory.</summary>
    /// <param name="system">The gap.</param>
    /// <param name="leastRimShare">The share of the rim, in sides of cells, that must be observed. Unit: 1, above 0.</param>
    public PolarGapFilling(PolarGapSystem system, double leastRimShare)
    {
        ArgumentNullException.ThrowIfNull(system);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(leastRimShare);
        (this.system, this.leastRimShare) = (system, leastRimShare);
        values = new double[system.Cells.Length];
        multiyears = new double[system.Cells.Length];
        int border = system.Border.Length;
        borderSums = new double[border];
        small = new double[border * border];
        smallValues = new double[border];
        lostSides = new int[border];
        broken = new int[border];
        observedSides = new int[system.SidesOfPiece.Length];
    }

    /// <summary>Fills the gap of one day.</summary>
    /// <param name="planes">
    /// Screened and clipped. A filled cell gets total, ice types, the rim's standard error (the root of its mean standard
    /// error squared and the variance among its values) and <see cref="CellConditions.FilledPolarGap"/>. Nothing else changes.
    /// </param>
    /// <returns>The number of cells filled; 0 where too little of the rim was observed.</returns>
    /// <exception cref="ArgumentException">The planes are of another grid.</exception>
    public int Fill(ConcentrationPlanes planes)
    {
        ArgumentNullException.ThrowIfNull(planes);
        if (planes.CellCount != system.CellCount)
        {
            throw new ArgumentException($"The planes have {planes.CellCount} cells; the grid has {system.CellCount}.", nameof(planes));
        }

        if (!CountSides(planes))
        {
            return 0;
        }

        int brokenCount = FactorBroken();
        RimSummary rim = RimSummary.Of(planes, system.Rim);
        Solve(planes, planes.Total, brokenCount, values);
        if (rim.HasIceTypes)
        {
            Solve(planes, planes.Multiyear, brokenCount, multiyears);
        }

        for (int index = 0; index < values.Length; index++)
        {
            int cell = system.Cells[index];
            double total = Math.Clamp(values[index], rim.Lowest, rim.Highest); // The solution keeps these bounds; its rounding need not.
            planes.Put(cell, total, rim.HasIceTypes ? Math.Max(0.0, multiyears[index]) : double.NaN, rim.StandardError);
            planes.Conditions[cell] |= CellConditions.FilledPolarGap;
        }

        return values.Length;
    }

    // Counts the lost sides of each border cell; false where too much of the rim of some piece is empty.
    private bool CountSides(ConcentrationPlanes planes)
    {
        lostSides.AsSpan().Clear();
        observedSides.AsSpan().Clear();
        foreach (RimSide side in system.Sides)
        {
            bool observed = planes.IsSeenInPlace(side.RimCell);
            observedSides[side.Piece] += observed ? 1 : 0;
            lostSides[side.BorderCell] += observed ? 0 : 1;
        }

        for (int piece = 0; piece < observedSides.Length; piece++)
        {
            int wanted = system.SidesOfPiece[piece];
            if (wanted > 0 && (observedSides[piece] == 0 || observedSides[piece] < leastRimShare * wanted))
            {
                return false;
            }
        }

        return values.Length > 0;
    }

    // Factors 1 − D½·G·D½ over the border cells that lost sides and returns their number.
    private int FactorBroken()
    {
        int count = 0;
        for (int place = 0; place < lostSides.Length; place++)
        {
            if (lostSides[place] > 0)
            {
                broken[count++] = place;
            }
        }

        ReadOnlySpan<double> response = system.BorderResponse;
        for (int row = 0; row < count; row++)
        {
            int at = broken[row];
            for (int column = 0; column <= row; column++)
            {
                double lost = Math.Sqrt((double)lostSides[at] * lostSides[broken[column]]);
                small[(row * count) + column - row + count - 1] = (column == row ? 1.0 : 0.0) - (lost * response[(at * lostSides.Length) + broken[column]]);
            }
        }

        BandedCholesky.Factor(small, count, count - 1);
        return count;
    }

    private void Solve(ConcentrationPlanes planes, ReadOnlySpan<float> plane, int brokenCount, double[] solution)
    {
        borderSums.AsSpan().Clear();
        foreach (RimSide side in system.Sides)
        {
            borderSums[side.BorderCell] += planes.IsSeenInPlace(side.RimCell) ? plane[side.RimCell] : 0.0;
        }

        ReadOnlySpan<double> response = system.BorderResponse;
        for (int index = 0; index < brokenCount; index++)
        {
            double sum = 0.0;
            ReadOnlySpan<double> row = response.Slice(broken[index] * borderSums.Length, borderSums.Length);
            for (int place = 0; place < row.Length; place++)
            {
                sum += row[place] * borderSums[place];
            }

            smallValues[index] = Math.Sqrt(lostSides[broken[index]]) * sum;
        }

        BandedCholesky.Solve(small, brokenCount, brokenCount - 1, smallValues);
        for (int index = 0; index < brokenCount; index++)
        {
            borderSums[broken[index]] += Math.Sqrt(lostSides[broken[index]]) * smallValues[index];
        }

        solution.AsSpan().Clear();
        for (int place = 0; place < borderSums.Length; place++)
        {
            solution[system.Border[place]] = borderSums[place];
        }

        BandedCholesky.Solve(system.Factor, solution.Length, system.Bandwidth, solution);
    }
}
