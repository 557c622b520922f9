using BandSpec.Core.Quantities;
using BandSpec.Tests.Numerics;
using Xunit;

namespace BandSpec.Tests.Quantities;

public sealed class PressureUnitTests
{
    /// <summary>Factors of NIST SP 811 (2008), appendix B.8, seven digits; entered from memory, no copy was at hand.</summary>
    [Theory]
    [InlineData("psi", 6.894757e3)]
    [InlineData("mmHg", 1.333224e2)]
    [InlineData("inH2O", 2.490889e2)]
    [InlineData("mmH2O", 9.806650)]
    [InlineData("bar", 1e5)]
    [InlineData("mbar", 1e2)]
    public void Factors_are_those_of_SP_811(string symbol, double pascals) =>
        Close.Relative(pascals, Unit(symbol).Pascals, 1e-6, symbol);

    /// <summary>The same factors as UnitsNet 5.75.1, a library that defines them independently.</summary>
    [Theory]
    [InlineData("Pa", UnitsNet.Units.PressureUnit.Pascal)]
    [InlineData("hPa", UnitsNet.Units.PressureUnit.Hectopascal)]
    [InlineData("kPa", UnitsNet.Units.PressureUnit.Kilopascal)]
    [InlineData("MPa", UnitsNet.Units.PressureUnit.Megapascal)]
    [InlineData("mbar", UnitsNet.Units.PressureUnit.Millibar)]
    [InlineData("bar", UnitsNet.Units.PressureUnit.Bar)]
    [InlineData("psi", UnitsNet.Units.PressureUnit.PoundForcePerSquareInch)]
    [InlineData("mmHg", UnitsNet.Units.PressureUnit.MillimeterOfMercury)]
    [InlineData("inH2O", UnitsNet.Units.PressureUnit.InchOfWaterColumn)]
    [InlineData("mmH2O", UnitsNet.Units.PressureUnit.MillimeterOfWaterColumn)]
    public void Factors_agree_with_UnitsNet(string symbol, UnitsNet.Units.PressureUnit unit) =>
        Close.Relative(UnitsNet.Pressure.From(1, unit).Pascals, Unit(symbol).Pascals, 2e-6, symbol);

    [Fact]
    public void Every_unit_there_and_back_is_the_same_pressure()
    {
        foreach (Core.Quantities.PressureUnit unit in Core.Quantities.PressureUnit.All)
            Close.Relative(250, Pressure.From(250, unit).In(Core.Quantities.PressureUnit.Bar).In(unit).Value, 1e-14, unit.Symbol);
    }

    private static Core.Quantities.PressureUnit Unit(string symbol) => Core.Quantities.PressureUnit.All.Single(u => u.Symbol == symbol);
}
