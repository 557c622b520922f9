using BandSpec.Cli.Printing;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>The estimate of the time that is left.</summary>
public sealed class PaceTests
{
    private sealed class Hand : TimeProvider
    {
        private long ticks;

        public override long TimestampFrequency => TimeSpan.TicksPerSecond;

        public override long GetTimestamp() => ticks;

        public void Wait(double seconds) => ticks += TimeSpan.FromSeconds(seconds).Ticks;
    }

    private readonly Hand clock = new();

    [Fact]
    public void A_steady_pace_is_told_exactly_and_not_at_once()
    {
        Pace pace = new(clock);
        Assert.Null(pace.Left(0, 1000));
        clock.Wait(0.4);
        Assert.Null(pace.Left(40, 1000));
        for (int tenths = 6; tenths < 90; tenths++)
        {
            clock.Wait(tenths == 6 ? 0.2 : 0.1);
            Assert.Equal((1000 - (10 * tenths)) / 100.0, pace.Left(10 * tenths, 1000)!.Value.TotalSeconds, 6);
        }
    }

    [Fact]
    public void A_slow_beginning_is_forgotten()
    {
        Pace pace = new(clock);
        pace.Left(0, 10_000);
        clock.Wait(20);
        pace.Left(20, 10_000);
        for (long done = 20; done < 1020; done += 100)
        {
            clock.Wait(1);
            pace.Left(done + 100, 10_000);
        }

        Assert.InRange(pace.Left(1020, 10_000)!.Value.TotalSeconds, 85, 95);
    }

    [Fact]
    public void Something_new_begins_anew_and_a_standstill_promises_nothing()
    {
        Pace pace = new(clock);
        pace.Left(0, 100);
        clock.Wait(1);
        Assert.NotNull(pace.Left(50, 100));
        Assert.Null(pace.Left(10, 100));
        clock.Wait(1);
        Assert.Null(pace.Left(10, 100));
        Assert.Null(pace.Left(20, 200));
    }
}
