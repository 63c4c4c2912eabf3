using IceExtent.Grids;
using IceExtent.Scenes.Fields;

namespace IceExtent.Scenes.Tests.Fields;

public sealed class SmoothFieldTests
{
    private const double Noon = 738_000.5;

    private static readonly GridFrame Frame = new(Columns: 40, Rows: 30, CellMeters: 25_000, LeftMeters: -500_000, TopMeters: 400_000);

    private static float[] Draw(FieldShape shape, ulong key, double time, GridFrame frame)
    {
        float[] plane = new float[frame.Rows * frame.Columns];
        new SmoothField(shape, key, frame).AddTo(time, 1.0, new(frame.Rows, frame.Columns), plane);
        return plane;
    }

    // Law: mean 0 and variance 1 over many fields. 4,000 fields, a dozen or more independent places each: the standard
    // error of the variance is below 0.01; the docstring allows a tenth.
    [Theory]
    [InlineData(300_000.0, 5.0, 1)]
    [InlineData(300_000.0, 5.0, 4)]
    [InlineData(300_000.0, double.PositiveInfinity, 3)]
    public void AddTo_ManyKeys_HaveMeanZeroAndVarianceOne(double node, double life, int octaves)
    {
        const int Fields = 4_000;
        double sum = 0, squares = 0;
        for (int key = 0; key < Fields; key++)
        {
            float[] plane = Draw(new(node, life, octaves, 0.6), (ulong)key, Noon, Frame);
            sum += plane.Average();
            squares += plane.Average(value => (double)value * value);
        }

        Assert.Equal(0.0, sum / Fields, 0.03);
        Assert.Equal(1.0, squares / Fields, 0.1);
    }

    // Law: a finer grid shows the same field. The middle of every third fine cell is the middle of a coarse one.
    [Fact]
    public void AddTo_FinerGrid_ShowsTheSameField()
    {
        FieldShape shape = new(200_000, 4, 3, 0.6, 300_000);
        GridFrame fine = new(3 * Frame.Columns, 3 * Frame.Rows, Frame.CellMeters / 3.0, Frame.LeftMeters, Frame.TopMeters);

        float[] coarse = Draw(shape, 7, Noon, Frame);
        float[] detailed = Draw(shape, 7, Noon, fine);

        for (int row = 0; row < Frame.Rows; row++)
        {
            for (int column = 0; column < Frame.Columns; column++)
            {
                Assert.Equal(
                    coarse[(row * Frame.Columns) + column], detailed[(((3 * row) + 1) * fine.Columns) + (3 * column) + 1], 1e-4f);
            }
        }
    }

    // Law: a field that drifts is the standing one moved along. With an endless life only the drift is left.
    [Fact]
    public void AddTo_DriftOfWholeCells_MovesTheField()
    {
        FieldShape shape = new(200_000, double.PositiveInfinity, 2, 0.6, 25_000);
        float[] today = Draw(shape, 3, Noon, Frame);
        float[] later = Draw(shape, 3, Noon + 8.0, Frame);

        Assert.NotEqual(today, later);
        double best = double.PositiveInfinity;
        for (int down = -8; down <= 8; down++)
        {
            for (int right = -8; right <= 8; right++)
            {
                best = Math.Min(best, Difference(today, later, down, right));
            }
        }

        // 8 cells along some direction: the nearest whole shift is at most 0.71 cells off, an eighth of a node.
        Assert.True(best < 0.2, $"The best shift leaves a mean difference of {best:F3}.");
        Assert.True(Difference(today, later, 0, 0) > 2.0 * best);
    }

    [Fact]
    public void AddTo_NextMoment_ChangesLittle()
    {
        FieldShape shape = new(300_000, 5, 2, 0.5);
        float[] now = Draw(shape, 1, Noon, Frame);
        float[] soon = Draw(shape, 1, Noon + 0.01, Frame);

        Assert.True(now.Zip(soon, (a, b) => Math.Abs(a - b)).Max() < 0.05);
    }

    private static double Difference(float[] first, float[] second, int down, int right)
    {
        double sum = 0;
        int count = 0;
        for (int row = 8; row < Frame.Rows - 8; row++)
        {
            for (int column = 8; column < Frame.Columns - 8; column++)
            {
                sum += Math.Abs(first[(row * Frame.Columns) + column] - second[((row + down) * Frame.Columns) + column + right]);
                count++;
            }
        }

        return sum / count;
    }
}
