using CsCheck;

namespace IceExtent.Retrieval.Tests.Filling;

/// <summary>What holds for any days.</summary>
public sealed class DayFillingLaws
{
    private const int Cells = 12;

    private static readonly Gen<DayFillingRules> Rules =
        Gen.Select(Gen.Int[0, 5], Gen.Int[0, 5], Gen.Double[0, 0.2]).Where(rules => rules.Item1 + rules.Item2 > 0).Select(rules => new DayFillingRules(rules.Item1, rules.Item2, rules.Item3));

    // Of every day from -7 to 7, whether it is there and which of its cells are.
    private static readonly Gen<bool[][]> Seen = Gen.Bool.Array[Cells].Array[15];

    /// <summary>A field that is linear in time comes back wherever it was seen on both sides.</summary>
    [Fact]
    public void Fill_FieldLinearInTime_ComesBack() =>
        Gen.Select(Gen.Int[1, 5], Gen.Int[1, 5], Gen.Double[0.2, 0.8].Array[Cells], Gen.Double[-0.025, 0.025].Array[Cells], Seen)
            .Sample((before, after, level, slope, seen) =>
            {
                DayStack days = StackOf(new(before, after, 0.03), seen, (offset, cell) => level[cell] + (slope[cell] * offset));
                days.Fill();
                for (int cell = 0; cell < Cells; cell++)
                {
                    if (Math.Abs(days.Today.Total[cell] - level[cell]) > 1e-6) // False where it is still empty.
                    {
                        return false;
                    }
                }

                return true;
            });

    /// <summary>
    /// A cell is filled exactly where the rule says so, from the nearest days that saw it, between their values, and with an error
    /// no smaller than the smaller of theirs; nothing that was there changes.
    /// </summary>
    [Fact]
    public void Fill_AnyDays_FollowsTheRule() =>
        Gen.Select(Rules, Gen.Double[0, 1].Array[Cells * 15], Seen).Sample((rules, values, seen) =>
        {
            DayStack days = StackOf(rules, seen, (offset, cell) => values[((offset + 7) * Cells) + cell]);
            float[] was = days.Today.Total.ToArray();
            int filled = days.Fill();
            int expected = 0;
            for (int cell = 0; cell < Cells; cell++)
            {
                if (seen[7][cell])
                {
                    if (!was[cell].Equals(days.Today.Total[cell]) || days.Today.Conditions[cell] != CellConditions.None)
                    {
                        return false;
                    }

                    continue;
                }

                int before = Nearest(seen, cell, -1, rules.DaysBefore), after = Nearest(seen, cell, 1, rules.DaysAfter);
                bool wanted = (before > 0 && after > 0) || (before > 0 && rules.DaysAfter == 0) || (after > 0 && rules.DaysBefore == 0);
                expected += wanted ? 1 : 0;
                if (!Right(days, cell, wanted, before, after))
                {
                    return false;
                }
            }

            return filled == expected;
        });

    private static bool Right(DayStack days, int cell, bool wanted, int before, int after)
    {
        float now = days.Today.Total[cell];
        if (!wanted)
        {
            return float.IsNaN(now) && days.Today.Conditions[cell] == CellConditions.NoObservation;
        }

        float[] ends = [.. new[] { -before, after }.Where(offset => offset != 0).Select(offset => days.At(offset).Total[cell])];
        return now >= ends.Min() - 1e-6f && now <= ends.Max() + 1e-6f
            && days.Today.StandardError[cell] >= DayStack.CellError - 1e-6f
            && days.Sources.Before.Span[cell].Equals(before > 0 ? before : float.NaN)
            && days.Sources.After.Span[cell].Equals(after > 0 ? after : float.NaN);
    }

    // Days to the nearest one that saw a cell, or 0 where there is none within the limit.
    private static int Nearest(bool[][] seen, int cell, int step, int limit) =>
        Enumerable.Range(1, 7).FirstOrDefault(distance => distance <= limit && seen[7 + (step * distance)][cell]);

    private static DayStack StackOf(DayFillingRules rules, bool[][] seen, Func<int, int, double> value) => new(
        rules,
        Cells,
        Enumerable.Range(-7, 15).ToDictionary(
            offset => offset,
            offset => Enumerable.Range(0, Cells).Select(cell => seen[offset + 7][cell] ? value(offset, cell) : double.NaN).ToArray()));

    /// <summary>The farther the ends and the more they differ, the larger the error.</summary>
    [Fact]
    public void StandardError_FartherOrMoreDifferent_IsNoSmaller() =>
        Gen.Select(Gen.Int[1, 15], Gen.Int[1, 15], Gen.Double[0, 0.5], Gen.Double[0, 0.5], Gen.Double[0, 0.1]).Sample((before, after, small, more, change) =>
        {
            (DayFilling filling, DayFilling still) = (new(new(15, 15, change)), new(new(15, 15, 0.0)));
            double near = filling.StandardErrorFraction(0.2, 0.05, before, 0.2 + small, 0.05, after);
            double far = filling.StandardErrorFraction(0.2, 0.05, 2 * before, 0.2 + small, 0.05, 2 * after);
            double alike = still.StandardErrorFraction(0.2, 0.05, before, 0.2 + small, 0.05, after);
            double different = still.StandardErrorFraction(0.2, 0.05, before, 0.2 + small + more, 0.05, after);
            return near >= 0.05 - 1e-12 && far >= near - 1e-12 && different >= alike - 1e-12
                && filling.CarriedErrorFraction(0.2 + small, 0.05, before + 1) >= filling.CarriedErrorFraction(0.2 + small, 0.05, before);
        });
}
