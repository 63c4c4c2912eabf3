using IceExtent.Grids;

namespace IceExtent.Scenes.Fields;

/// <summary>What a smooth random field looks like.</summary>
/// <param name="NodeMeters">The distance between the lattice's nodes: features are a few times as wide. In m.</param>
/// <param name="LifeDays">How long a feature lasts, in days; infinite for one that stands still.</param>
/// <param name="Octaves">How many lattices are added, each half as wide and short-lived as the one before; 1 or more.</param>
/// <param name="Roughness">How strong each lattice is against the one before, 0 to 1.</param>
/// <param name="DriftMetersPerDay">How far the features travel, in m a day.</param>
internal sealed record FieldShape(
    double NodeMeters, double LifeDays, int Octaves, double Roughness, double DriftMetersPerDay = 0.0);

/// <summary>A smooth random field over the map, defined at every place and time.</summary>
/// <remarks>
/// Normal values on a lattice in space and time, blended by cubic B-splines in all three directions. The mean is 0;
/// the variance, over many fields, is 1 to within a tenth at every place. Defined in meters, so finer grids show the
/// same field.
/// </remarks>
internal sealed class SmoothField
{
    // The sum of squared B-spline weights is 0.4794 on average over one step: variance lost by blending on one axis.
    private const double MeanSquareWeight = 0.4794;

    private readonly FieldShape shape;
    private readonly ulong key;
    private readonly GridFrame frame;
    private readonly double[] amplitudes;
    private readonly double driftX;
    private readonly double driftY;

    /// <summary>Sets a field up; nothing is drawn yet.</summary>
    public SmoothField(FieldShape shape, ulong key, GridFrame frame)
    {
        (this.shape, this.key, this.frame) = (shape, key, frame);
        double direction = Math.Tau * Draws.Unit(Draws.Key(key, -1));
        driftX = shape.DriftMetersPerDay * Math.Cos(direction);
        driftY = shape.DriftMetersPerDay * Math.Sin(direction);

        amplitudes = new double[shape.Octaves];
        double squares = 0.0;
        for (int octave = 0; octave < amplitudes.Length; octave++)
        {
            amplitudes[octave] = Math.Pow(shape.Roughness, octave);
            squares += amplitudes[octave] * amplitudes[octave];
        }

        for (int octave = 0; octave < amplitudes.Length; octave++)
        {
            amplitudes[octave] /= Math.Sqrt(squares) * MeanSquareWeight;
        }
    }

    /// <summary>Adds the field at one time to a plane.</summary>
    /// <param name="time">In days, on the scale of <see cref="DateOnly.DayNumber"/>.</param>
    /// <param name="factor">What the field is multiplied by.</param>
    /// <param name="scratch">Room of the same grid.</param>
    /// <param name="plane">One value a cell, row-major; may be longer.</param>
    public void AddTo(double time, double factor, FieldScratch scratch, Span<float> plane)
    {
        for (int octave = 0; octave < amplitudes.Length; octave++)
        {
            ulong octaveKey = Draws.Key(key, octave);
            double shrink = Math.ScaleB(1.0, -octave);
            double node = shape.NodeMeters * shrink;
            double phase = Draws.Unit(Draws.Key(octaveKey, -1));
            scratch.Columns.Place(
                ((frame.LeftMeters + (0.5 * frame.CellMeters) - (driftX * time)) / node) + phase,
                frame.CellMeters / node);
            scratch.Rows.Place(
                ((frame.TopMeters - (0.5 * frame.CellMeters) - (driftY * time)) / node) + phase,
                -frame.CellMeters / node);
            FillLattice(octaveKey, (time / (shape.LifeDays * shrink)) + phase, amplitudes[octave] * factor, scratch);
            scratch.AddStretched(plane);
        }
    }

    private static void FillLattice(ulong octaveKey, double moment, double amplitude, FieldScratch scratch)
    {
        Span<double> blend = stackalloc double[4];
        double frameIndex = Math.Floor(moment);
        CubicAxis.BlendWeights(moment - frameIndex, blend);
        double norm = Math.Sqrt((blend[0] * blend[0]) + (blend[1] * blend[1]) + (blend[2] * blend[2]) + (blend[3] * blend[3]));

        Span<ulong> frames = stackalloc ulong[4];
        for (int index = 0; index < 4; index++)
        {
            blend[index] *= amplitude / norm; // In time the variance is kept exactly.
            frames[index] = Draws.Key(octaveKey, (long)frameIndex + index);
        }

        Span<float> lattice = scratch.Lattice();
        int nodes = scratch.Columns.NodeCount;
        for (int index = 0; index < lattice.Length; index++)
        {
            // Rows run down the grid while y runs up; only the place on the map matters.
            long place = ((scratch.Rows.FirstNode + (index / nodes)) << 32) ^ ((scratch.Columns.FirstNode + (index % nodes)) & 0xFFFF_FFFFL);
            double sum = 0.0;
            for (int slice = 0; slice < 4; slice++)
            {
                sum += blend[slice] * Draws.Normal(Draws.Key(frames[slice], place));
            }

            lattice[index] = (float)sum;
        }
    }
}
