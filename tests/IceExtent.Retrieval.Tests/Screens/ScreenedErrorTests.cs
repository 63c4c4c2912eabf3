namespace IceExtent.Retrieval.Tests.Screens;

/// <summary>Standard errors of cells that were set to open water.</summary>
public sealed class ScreenedErrorTests
{
    /// <summary>Origin: worked. Each of the four conditions, one of them beside another; a plain cell and a missing one stay.</summary>
    [Fact]
    public void Apply_ConditionsThatEmpty_GetTheirError()
    {
        CellConditions[] conditions =
        [
            CellConditions.None, CellConditions.WeatherGradient3719, CellConditions.WeatherGradient2219 | CellConditions.CoastCorrected,
            CellConditions.OutsideIceMask, CellConditions.WarmWater, CellConditions.ClippedBelow, CellConditions.WeatherGradient3719,
        ];
        float[] errors = [0.07f, 0.07f, 0.07f, 0.07f, 0.07f, 0.07f, float.NaN];

        ScreenedError.Apply(conditions, 0.045f, errors);

        Assert.Equal([0.07f, 0.045f, 0.045f, 0.045f, 0.045f, 0.07f, float.NaN], errors);
    }

    [Fact]
    public void Apply_PlanesOfTwoLengths_AreRefused() =>
        Assert.Throws<ArgumentException>(() => ScreenedError.Apply(new CellConditions[2], 0.045f, new float[3]));
}
