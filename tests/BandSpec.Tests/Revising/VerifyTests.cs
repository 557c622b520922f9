using BandSpec.Cli.Verifying;
using BandSpec.Files.Json;
using CsCheck;
using Xunit;

namespace BandSpec.Tests.Revising;

/// <summary>Whatever is changed in a package, verify does not let it pass.</summary>
public sealed class VerifyTests : IClassFixture<VerifyTests.ReleasedPackage>
{
    private readonly ReleasedPackage package;

    public VerifyTests(ReleasedPackage package) => this.package = package;

    [Fact]
    public void Any_flipped_byte_in_any_file_shows()
    {
        foreach (string file in package.Files)
        {
            int length = (int)new FileInfo(file).Length;
            foreach (int at in Offsets(length))
            {
                package.Flip(file, at, 1 << (at % 8));
                try
                {
                    Screen screen = package.Shop.Run("verify", "out/HV-3107-A", "--quiet");
                    Assert.True(screen.ExitCode == 1, $"{Path.GetFileName(file)} at {at}: {screen.Output}{screen.Error}");
                }
                finally
                {
                    package.Flip(file, at, 1 << (at % 8));
                }
            }
        }

        Assert.Equal(0, package.Shop.Run("verify", "out/HV-3107-A", "--quiet").ExitCode);
    }

    [Fact]
    public void Many_bytes_of_every_file_flipped_one_by_one_show()
    {
        PackageFile[] made = [.. package.Files.Select(file => new PackageFile(Path.GetFileName(file), File.ReadAllBytes(file)))];
        string copy = package.Shop.PathOf("copy");
        Directory.CreateDirectory(copy);
        foreach (PackageFile file in made)
            File.WriteAllBytes(Path.Combine(copy, file.Name), file.Bytes.Span);
        Assert.All(FileComparison.OfFolder(copy, made), part => Assert.Null(part.Fault));
        foreach (PackageFile file in made)
            foreach (int at in Enumerable.Range(0, 60).Select(i => (int)((long)(file.Bytes.Length - 1) * i / 59)).Distinct())
            {
                package.Flip(Path.Combine(copy, file.Name), at, 1 << (at % 8));
                VerifiedPart[] faults = [.. FileComparison.OfFolder(copy, made).Where(part => part.Fault is not null)];
                package.Flip(Path.Combine(copy, file.Name), at, 1 << (at % 8));
                Assert.StartsWith($"it differs from what its inputs give, first at byte {at};", Assert.Single(faults, fault => fault.What == file.Name).Fault, StringComparison.Ordinal);
            }

        Directory.Delete(copy, recursive: true);
    }

    [Fact]
    public void Any_flipped_byte_in_the_release_record_shows()
    {
        string record = package.Shop.PathOf("releases.json");
        Assert.Equal(0, package.Shop.Run("verify", "out/HV-3107-A", "--record", "releases.json", "--quiet").ExitCode);
        int length = (int)new FileInfo(record).Length;
        foreach (int at in Offsets(length))
        {
            package.Flip(record, at, 1 << (at % 8));
            Screen screen = package.Shop.Run("verify", "out/HV-3107-A", "--record", "releases.json", "--quiet");
            package.Flip(record, at, 1 << (at % 8));
            Assert.True(screen.ExitCode == 1, $"at {at}: {screen.Output}{screen.Error}");
            Assert.StartsWith("DIFFERS releases.json: ", screen.Output, StringComparison.Ordinal);
        }
    }

    [Fact]
    public void Any_flipped_byte_in_a_document_alone_shows()
    {
        string pdf = package.Files.Single(file => file.EndsWith(".pdf", StringComparison.Ordinal));
        byte[] original = File.ReadAllBytes(pdf);
        string copy = package.Shop.PathOf("copy.pdf");
        foreach (int at in Offsets(original.Length))
        {
            byte[] changed = [.. original];
            changed[at] ^= (byte)(1 << (at % 8));
            File.WriteAllBytes(copy, changed);
            Assert.Equal(1, package.Shop.Run("verify", "copy.pdf", "--quiet").ExitCode);
        }
    }

    [Fact]
    public void A_missing_file_and_a_file_too_many_show()
    {
        string limits = package.Files.Single(file => file.EndsWith("limits.json", StringComparison.Ordinal)), away = package.Shop.PathOf("away");
        File.Move(limits, away);
        Screen missing = package.Shop.Run("verify", "out/HV-3107-A", "--quiet");
        File.Move(away, limits);
        Assert.Equal((1, "DIFFERS limits.json: it is missing\n"), (missing.ExitCode, missing.Output));
        string stranger = Path.Combine(Path.GetDirectoryName(limits)!, "limits-new.json");
        File.WriteAllText(stranger, "{}");
        Screen more = package.Shop.Run("verify", "out/HV-3107-A", "--quiet");
        File.Delete(stranger);
        Assert.Equal((1, "DIFFERS limits-new.json: it is not a file of the package\n"), (more.ExitCode, more.Output));
    }

    [Theory]
    [InlineData("nowhere", "DIFFERS nowhere: there is no such file")]
    [InlineData("brine.yaml", "DIFFERS brine.yaml: it is not the PDF of a specification, or it was damaged")]
    [InlineData("platforms", "DIFFERS specification.pdf: it is missing, and with it what everything could be computed from")]
    public void What_is_no_specification_is_not_verified(string name, string found)
    {
        Screen screen = package.Shop.Run("verify", name);
        Assert.Equal(1, screen.ExitCode);
        Assert.Contains(found, screen.Output, StringComparison.Ordinal);
    }

    /// <summary>Both ends, and some in between that differ from run to run of the whole suite but not within one.</summary>
    private static IEnumerable<int> Offsets(int length) =>
        Gen.Int[0, length - 1].Array[Rounds].Single().Concat([0, length / 2, length - 1]).Distinct();

    /// <summary>BANDSPEC_FLIPS makes the run a long one.</summary>
    private static int Rounds => int.TryParse(Environment.GetEnvironmentVariable("BANDSPEC_FLIPS"), out int rounds) ? rounds : 2;

    /// <summary>A released package.</summary>
    public sealed class ReleasedPackage : IDisposable
    {
        public ReleasedPackage()
        {
            Assert.Equal(0, Shop.Release("Ylva Strøm").ExitCode);
            Files = [.. Directory.EnumerateFiles(Shop.PathOf("out/HV-3107-A")).Order(StringComparer.Ordinal)];
        }

        internal Workshop Shop { get; } = new();

        public string[] Files { get; }

        public void Flip(string file, int at, int bit)
        {
            byte[] bytes = File.ReadAllBytes(file);
            bytes[at] ^= (byte)bit;
            File.WriteAllBytes(file, bytes);
        }

        public void Dispose() => Shop.Dispose();
    }
}
