namespace IceExtent.Scenes.Emission;

/// <summary>The emissivities of the surfaces in one channel. Unit: 1.</summary>
/// <param name="WaterShift">What is added to the ocean model's emissivity so that it meets the sensor's tie point.</param>
/// <param name="FirstYear">Dry first-year ice (type A).</param>
/// <param name="Multiyear">Dry multiyear ice (type B).</param>
/// <param name="WetIce">Ice under wet snow.</param>
/// <param name="Land">Land.</param>
public sealed record ChannelSurfaces(double WaterShift, double FirstYear, double Multiyear, double WetIce, double Land);
