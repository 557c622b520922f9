using System.Reflection;
using System.Text.RegularExpressions;
using BandSpec.Core.Specifying;
using Xunit;

namespace BandSpec.Tests.House;

/// <summary>The arrows between the rooms of the Core, read from its sources.</summary>
public sealed partial class RoomTests
{
    /// <summary>A room may use itself and every room named here before it, but for those of the exceptions.</summary>
    private static readonly string[] Order =
    [
        "Quantities", "Numerics", "Findings", "Requirements", "Residuals", "Bands", "Planning", "Allocating", "TestLimits", "Deciding", "Specifying", "Characterizing",
        "VirtualLots", "Revisions",
    ];

    [Fact]
    public void A_room_uses_only_rooms_above_it()
    {
        List<string> wrong = [];
        foreach (string file in Sources("BandSpec.Core"))
        {
            string room = Path.GetFileName(Path.GetDirectoryName(file)!);
            foreach (string used in RoomsIn(file))
                if (Array.IndexOf(Order, used) > Array.IndexOf(Order, room) && Array.IndexOf(Order, room) >= 0)
                    wrong.Add($"{room}/{Path.GetFileName(file)} uses {used}");
        }

        Assert.Empty(wrong);
    }

    [Fact]
    public void The_core_knows_no_file_clock_console_or_environment()
    {
        List<string> wrong = [];
        foreach (string file in Sources("BandSpec.Core"))
            if (OutsideWorld().Match(File.ReadAllText(file)) is { Success: true } match)
                wrong.Add($"{Path.GetFileName(file)}: {match.Value}");
        Assert.Empty(wrong);
    }

    [Fact]
    public void Classes_of_the_core_are_sealed_or_static() => Assert.Empty(
        typeof(Specification).Assembly.GetTypes()
            .Where(t => t is { IsClass: true, IsSealed: false, IsAbstract: false } && t.GetCustomAttribute<System.Runtime.CompilerServices.CompilerGeneratedAttribute>() is null)
            .Select(t => t.FullName));

    private static IEnumerable<string> Sources(string project) =>
        Directory.EnumerateFiles(Path.Combine(Tree.Root, "src", project), "*.cs", SearchOption.AllDirectories);

    private static IEnumerable<string> RoomsIn(string file) =>
        UsedRoom().Matches(File.ReadAllText(file)).Select(m => m.Groups[1].Value);

    [GeneratedRegex(@"^using BandSpec\.Core\.(\w+);", RegexOptions.Multiline)]
    private static partial Regex UsedRoom();

    [GeneratedRegex(@"\b(System\.IO|File\.|Directory\.|Console\.|Environment\.|DateTime\.(Utc)?Now|Stopwatch|TimeProvider\.System|new Random\()")]
    private static partial Regex OutsideWorld();
}
