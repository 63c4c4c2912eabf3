using IceExtent.Grids;
using IceExtent.Retrieval;
using MathNet.Numerics.Distributions;

namespace IceExtent.Statistics.Tests;

/// <summary>The formula for standard errors of totals against a Monte Carlo run of the same model.</summary>
public sealed class TotalsUncertaintyTests
{
    private const double Length = 150_000.0;

    /// <summary>
    /// Origin: independent, 3,000 draws of correlated Gaussian errors (white noise through the square root of the
    /// correlation, a Gaussian of half the variance) added to a scene with an ice edge; seed 20260101. The draws' own
    /// standard deviations are known to 1.3 %, so 5 % is a test of the formula. In extent, cells of no ice have errors of their own,
    /// one a square of two by two.
    /// </summary>
    [Theory]
    [InlineData(0.05)]
    [InlineData(0.12)]
    public void StandardErrors_SceneWithAnEdge_AgreeWithMonteCarlo(double cellError)
    {
        Grid grid = SmallGrid.EqualArea(36, 40);
        TotalsRegion region = TotalsRegion.Hemisphere(grid, SmallGrid.AllOcean(grid));
        float[] total = Edge(grid);
        float[] errors = Enumerable.Repeat((float)cellError, grid.CellCount).ToArray();

        (double extent, double area) = new TotalsUncertainty(new ErrorCorrelation(grid, Length, 50_000.0, 50_000.0))
            .StandardErrorsSquareMeters(region, total, errors, 0.15);

        (double drawnExtent, double drawnArea) = MonteCarlo(grid, total, cellError);
        Assert.InRange(extent / drawnExtent, 0.95, 1.05);
        Assert.InRange(area / drawnArea, 0.95, 1.05);
    }

    /// <summary>
    /// Origin: independent, as above, with a local part besides: of a cell's error 0.06 is alike over the length and the rest, up to 0.12,
    /// over squares of two by two cells. Area within 5 %; extent does not know the parts.
    /// </summary>
    [Fact]
    public void StandardErrors_LocalPart_AgreesWithMonteCarloInArea()
    {
        Grid grid = SmallGrid.EqualArea(36, 40);
        TotalsRegion region = TotalsRegion.Hemisphere(grid, SmallGrid.AllOcean(grid));
        float[] total = Edge(grid);
        float[] errors = Enumerable.Repeat(0.12f, grid.CellCount).ToArray();
        RetrievalScatter scatter = new(0.06, 0.06); // Of cells between, less: as much as the mixture leaves.

        (double extent, double area) = new TotalsUncertainty(new ErrorCorrelation(grid, Length, 50_000.0, 50_000.0))
            .StandardErrorsSquareMeters(region, total, errors, 0.15, scatter);

        (_, double drawnArea) = MonteCarlo(grid, total, 0.12, cell => scatter.At(total[cell]));
        (double whole, double wholeArea) = new TotalsUncertainty(new ErrorCorrelation(grid, Length, 50_000.0, 50_000.0)).StandardErrorsSquareMeters(region, total, errors, 0.15);
        Assert.InRange(area / drawnArea, 0.95, 1.05);
        Assert.True(area < 0.9 * wholeArea);
        Assert.Equal(whole, extent);
    }

    /// <summary>Origin: worked by hand: what all of the edge has in common is independent of the rest, so squares add.</summary>
    [Fact]
    public void StandardErrors_EdgeShift_AddsInSquaresToExtentAlone()
    {
        Grid grid = SmallGrid.EqualArea(36, 40);
        TotalsRegion region = TotalsRegion.Hemisphere(grid, SmallGrid.AllOcean(grid));
        float[] errors = Enumerable.Repeat(0.05f, grid.CellCount).ToArray();
        TotalsUncertainty uncertainty = new(new ErrorCorrelation(grid, Length, 50_000.0, 50_000.0));

        (double without, double area) = uncertainty.StandardErrorsSquareMeters(region, Edge(grid), errors, 0.15);
        (double with, double sameArea) = uncertainty.StandardErrorsSquareMeters(region, Edge(grid), errors, 0.15, edgeShiftSquareMeters: 2e10);

        Assert.Equal(Math.Sqrt((without * without) + 4e20), with, 1e-9 * with);
        Assert.Equal(area, sameArea);
    }

    /// <summary>
    /// Origin: worked by hand: one square of four cells of 625 km² without ice. Two cells whose limit lies one standard error away count
    /// with p = 0.158655, two at two standard errors with q = 0.022750, and only when the others do. In cells squared:
    /// 4 p(1 − p) + 4 q(1 − q) + 8 (q − pq) = 0.533936 + 0.088930 + 0.153125 = 0.775991; its root times 625 km² is 550.6 km².
    /// </summary>
    [Fact]
    public void StandardErrors_OneSquareWithoutIce_IsThatOfOneDraw()
    {
        Grid grid = SmallGrid.EqualArea(2, 2);
        TotalsRegion region = TotalsRegion.Hemisphere(grid, SmallGrid.AllOcean(grid));

        (double extent, _) = new TotalsUncertainty(new ErrorCorrelation(grid, Length, 25_000.0, 50_000.0))
            .StandardErrorsSquareMeters(region, new float[4], [0.15f, 0.075f, 0.075f, 0.15f], 0.15);

        Assert.Equal(550.6e6, extent, 0.1e6);
    }

    [Fact]
    public void StandardErrors_MissingCells_BringNothing()
    {
        Grid grid = SmallGrid.EqualArea(3, 3);
        TotalsRegion region = TotalsRegion.Hemisphere(grid, SmallGrid.AllOcean(grid));
        float[] nothing = Enumerable.Repeat(float.NaN, 9).ToArray();

        (double extent, double area) = new TotalsUncertainty(new ErrorCorrelation(grid, Length, 50_000.0, 50_000.0))
            .StandardErrorsSquareMeters(region, nothing, nothing, 0.15);

        Assert.Equal(0.0, extent);
        Assert.Equal(0.0, area);
    }

    // Concentration rises from 0 to 1 over eight columns, with a wavy edge.
    private static float[] Edge(Grid grid) => [.. Enumerable.Range(0, grid.CellCount).Select(cell =>
    {
        double edge = 20.0 + (4.0 * Math.Sin(cell / grid.Columns / 5.0));
        return (float)Math.Clamp(((cell % grid.Columns) - edge) / 8.0, 0.0, 1.0);
    })];

    // Area counts the cells that are ice in the scene itself; the formula holds that set fixed too.
    private static (double Extent, double Area) MonteCarlo(Grid grid, float[] total, double cellError, Func<int, double>? far = null)
    {
        const int draws = 3_000;
        const double cellArea = 625e6;
        double[] kernel = SquareRootKernel(grid);
        Random random = new(Seed: 20_260_101);
        List<double> extents = [];
        List<double> areas = [];
        for (int draw = 0; draw < draws; draw++)
        {
            double[] error = Correlated(grid, kernel, random);
            double[] squares = Squares(grid, random);
            double extent = 0.0;
            double area = 0.0;
            for (int cell = 0; cell < total.Length; cell++)
            {
                double alike = far?.Invoke(cell) ?? cellError;
                double value = total[cell] + (alike * error[cell])
                    + (far is null ? 0.0 : Math.Sqrt((cellError * cellError) - (alike * alike)) * squares[cell]);
                double counted = total[cell] > 0f ? value : cellError * squares[cell];
                extent += counted >= 0.15 ? cellArea : 0.0;
                area += total[cell] >= 0.15f ? value * cellArea : 0.0;
            }

            extents.Add(extent);
            areas.Add(area);
        }

        return (Deviation(extents), Deviation(areas));
    }

    // One draw a square of two by two cells.
    private static double[] Squares(Grid grid, Random random)
    {
        double[] draws = new double[grid.CellCount];
        Normal.Samples(random, draws, 0.0, 1.0);
        return [.. Enumerable.Range(0, grid.CellCount).Select(cell => draws[(cell / grid.Columns / 2 * 2 * grid.Columns) + (cell % grid.Columns / 2 * 2)])];
    }

    private static double Deviation(List<double> values)
    {
        double mean = values.Average();
        return Math.Sqrt(values.Sum(value => (value - mean) * (value - mean)) / (values.Count - 1));
    }

    // exp(−d²/(2L²)) is the autoconvolution of a Gaussian with length L/√2.
    private static double[] SquareRootKernel(Grid grid)
    {
        int reach = (int)(3.5 * Length / Math.Sqrt(2.0) / grid.Frame.CellMeters);
        double[] kernel = [.. Enumerable.Range(-reach, (2 * reach) + 1).Select(step => Math.Exp(-Math.Pow(step * grid.Frame.CellMeters / Length, 2)))];
        double norm = Math.Sqrt(kernel.Sum(value => value * value));
        return Array.ConvertAll(kernel, value => value / norm);
    }

    private static double[] Correlated(Grid grid, double[] kernel, Random random)
    {
        int reach = kernel.Length / 2;
        int width = grid.Columns + (2 * reach);
        int height = grid.Rows + (2 * reach);
        double[] noise = new double[width * height];
        Normal.Samples(random, noise, 0.0, 1.0);
        double[] across = new double[height * grid.Columns];
        for (int row = 0; row < height; row++)
        {
            for (int column = 0; column < grid.Columns; column++)
            {
                for (int tap = 0; tap < kernel.Length; tap++)
                {
                    across[(row * grid.Columns) + column] += kernel[tap] * noise[(row * width) + column + tap];
                }
            }
        }

        double[] field = new double[grid.CellCount];
        for (int cell = 0; cell < field.Length; cell++)
        {
            for (int tap = 0; tap < kernel.Length; tap++)
            {
                field[cell] += kernel[tap] * across[(((cell / grid.Columns) + tap) * grid.Columns) + (cell % grid.Columns)];
            }
        }

        return field;
    }
}
