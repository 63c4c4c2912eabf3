namespace IceExtent.Scenes.Fields;

/// <summary>The normal distribution as a table of 65,536 equally likely values.</summary>
/// <remarks>
/// One 64-bit hash gives four draws, each by one look-up, which is what makes noise on every cell cheap. The largest
/// value is 4.32; the table is scaled so that its variance is exactly 1. Quantiles: [Wichura1988], algorithm AS 241
/// (constants from memory; checked to 1e-9 against an independent program, see <c>NormalTableTests</c>).
/// </remarks>
internal static class NormalTable
{
    private const int Size = 1 << 16;

    private static readonly double[] NearTop =
    [
        2509.0809287301226727, 33430.575583588128105, 67265.770927008700853, 45921.953931549871457,
        13731.693765509461125, 1971.5909503065514427, 133.14166789178437745, 3.3871328727963666080,
    ];

    private static readonly double[] NearBottom =
    [
        5226.4952788528545610, 28729.085735721942674, 39307.895800092710610, 21213.794301586595867,
        5394.1960214247511077, 687.18700749205790830, 42.313330701600911252, 1.0,
    ];

    private static readonly double[] FarTop =
    [
        7.74545014278341407640e-4, 0.0227238449892691845833, 0.241780725177450611770, 1.27045825245236838258,
        3.64784832476320460504, 5.76949722146069140550, 4.63033784615654529590, 1.42343711074968357734,
    ];

    private static readonly double[] FarBottom =
    [
        1.05075007164441684324e-9, 5.47593808499534494600e-4, 0.0151986665636164571966, 0.148103976427480074590,
        0.689767334985100004550, 1.67638483018380384940, 2.05319162663775882187, 1.0,
    ];

    private static readonly float[] Values = Build();

    /// <summary>The value of 16 random bits.</summary>
    public static float Pick(ushort bits) => Values[bits];

    /// <summary>The value below which a share of the normal distribution lies.</summary>
    /// <param name="share">From 1e-11 to 1 − 1e-11.</param>
    public static double Quantile(double share)
    {
        double middle = share - 0.5;
        if (Math.Abs(middle) <= 0.425)
        {
            double near = 0.180625 - (middle * middle);
            return middle * Polynomial(NearTop, near) / Polynomial(NearBottom, near);
        }

        double far = Math.Sqrt(-Math.Log(middle < 0.0 ? share : 1.0 - share)) - 1.6;
        return Math.Sign(middle) * Polynomial(FarTop, far) / Polynomial(FarBottom, far);
    }

    private static float[] Build()
    {
        double[] exact = new double[Size];
        double squares = 0.0;
        for (int index = 0; index < Size; index++)
        {
            exact[index] = Quantile((index + 0.5) / Size);
            squares += exact[index] * exact[index];
        }

        double scale = Math.Sqrt(Size / squares);
        return Array.ConvertAll(exact, value => (float)(value * scale));
    }

    // Coefficients from the highest power down.
    private static double Polynomial(double[] coefficients, double x)
    {
        double sum = 0.0;
        foreach (double coefficient in coefficients)
        {
            sum = (sum * x) + coefficient;
        }

        return sum;
    }
}
