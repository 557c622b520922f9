using System.Collections;
using System.Reflection;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Revisions;
using Xunit;

namespace BandSpec.Tests.Revisions;

/// <summary>No field of an input can be added without the comparison and the causes knowing of it.</summary>
public sealed class EveryFieldTests
{
    private static readonly ApplicationInputs Inputs = new(
        Given.Requirement with
        {
            Test = new VerificationRules(1, [Given.C(0), Given.C(25)]) { Risk = 0.1 },
            Compensation = Given.Requirement.Compensation with { Pinned = new PinnedPlan([Given.C(0), Given.C(25)], 1, 1) },
            Capability = Given.Requirement.Capability with { Confidence = 0.9 },
            AllowedError = [new(Given.C(-20), Given.C(150), Given.P(1), Given.P(2), 0.02)],
        },
        Given.Platform with
        {
            Sample = new PlatformSample
            {
                Units = 30, Lots = 3, Readings = 900, Coefficients = [new CoefficientAccuracy(new CoefficientName(PressureShape.Zero, 0), 1, 1, [1])],
                PressureHysteresis = Accuracy, ThermalHysteresis = Accuracy, RepeatabilityVarianceError = 1,
                Ageing = new AgeingAccuracy(10, Accuracy, Accuracy, 1, 1),
            },
        },
        Given.Station);

    private static SpreadAccuracy Accuracy => new(Given.P(0.1), 0.1);

    [Fact]
    public void A_change_of_any_field_is_a_change_of_the_comparison()
    {
        (string Path, ApplicationInputs Changed)[] all = [.. Variants(Inputs, "").Select(v => (v.Path, (ApplicationInputs)v.Changed))];
        Assert.InRange(all.Length, 90, 300);
        Assert.Empty(all.Where(one => Comparison.InputsBetween(Inputs, one.Changed).Count == 0).Select(one => one.Path));
    }

    [Fact]
    public void A_change_of_any_field_that_enters_the_result_belongs_to_exactly_one_group()
    {
        string[] names = [".Requirement.Identity", ".Requirement.PlatformFile", ".Requirement.StationFile", ".Platform.Name", ".Platform.Revision", ".Station.Name"];
        foreach ((string path, object changed) in Variants(Inputs, "").Where(v => !names.Any(n => v.Path.StartsWith(n, StringComparison.Ordinal))))
        {
            InputGroup[] groups = [.. InputGroup.All.Where(g => Comparison.InputsBetween(Inputs, g.Swap(Inputs, (ApplicationInputs)changed)).Count > 0)];
            Assert.True(groups.Length == 1, $"{path}: {string.Join(", ", groups.Select(g => g.Name))}");
        }
    }

    /// <summary>Copies of a record, in each of which one field far down is another.</summary>
    private static IEnumerable<(string Path, object Changed)> Variants(object record, string path)
    {
        foreach (PropertyInfo property in record.GetType().GetProperties().Where(p => p.CanWrite))
            foreach ((string below, object? value) in Others(property.GetValue(record), property.PropertyType, $"{path}.{property.Name}"))
            {
                object copy = record.GetType().GetMethod("<Clone>$")!.Invoke(record, null)!;
                property.SetValue(copy, value);
                yield return (below, copy);
            }
    }

    private static IEnumerable<(string Path, object? Value)> Others(object? value, Type type, string path) => value switch
    {
        null => throw new InvalidOperationException($"{path} has no value to be changed"),
        string text => [(path, text + "x")],
        double number => [(path, number + 1)],
        int number => [(path, number + 1)],
        Enum word => [(path, Enum.GetValues(word.GetType()).Cast<object>().First(w => !w.Equals(word)))],
        DateOnly date => [(path, date.AddDays(1))],
        Temperature temperature => [(path, Given.C(temperature.Celsius + 1))],
        TemperatureDifference difference => [(path, Given.K(difference.Kelvin + 1))],
        PercentOfSpan error => [(path, Given.P(error.Percent + 1))],
        Duration duration => [(path, Duration.FromHours(duration.Hours + 1))],
        Pressure pressure => [(path, Pressure.From(pressure.Value + 1, pressure.Unit)), (path, Pressure.From(pressure.Value, PressureUnit.Psi))],
        CoefficientName name => [(path, name with { Degree = name.Degree + 1 })],
        IList list => OtherLists(list, type, path),
        _ => Variants(value, path).Select(v => (v.Path, (object?)v.Changed)),
    };

    /// <summary>The list with its last item another, and without it.</summary>
    private static IEnumerable<(string Path, object? Value)> OtherLists(IList list, Type type, string path)
    {
        Type item = type.GetGenericArguments()[0];
        foreach ((string below, object? value) in Others(list[^1], item, $"{path}[^1]"))
            yield return (below, ArrayOf(item, [.. list.Cast<object?>().SkipLast(1), value]));
        yield return ($"{path} without its last", ArrayOf(item, [.. list.Cast<object?>().SkipLast(1)]));
    }

    private static Array ArrayOf(Type item, object?[] values)
    {
        var array = Array.CreateInstance(item, values.Length);
        values.CopyTo(array, 0);
        return array;
    }
}
