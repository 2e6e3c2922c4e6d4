using Redshift.Pipeline.Match.Models;
using Xunit;

namespace Redshift.Pipeline.Tests.Match;

public class RecentlyUsedTests
{
    private const int Size = 10;
    private const int Room = 16;

    private readonly List<int> _made = [];
    private readonly RecentlyUsed<int, string> _kept;

    public RecentlyUsedTests() => _kept = new(Room * Size, Make, static _ => Size);

    [Fact]
    public void What_is_kept_is_made_once()
    {
        Assert.Equal(_kept[1], _kept[1]);
        Assert.Equal(_kept[2], _kept[2]);
        Assert.Equal([1, 2], _made);
    }

    [Fact]
    public void No_more_is_kept_than_there_is_room_for()
    {
        for (var key = 0; key < 100; key++)
        {
            Assert.Equal($"{key}", _kept[key]);
            Assert.InRange(_kept.Bytes, Size, Room * Size);
        }

        Assert.InRange(_kept.Bytes, (Room - 2) * Size, Room * Size);
    }

    [Fact]
    public void What_was_used_longest_ago_makes_room()
    {
        // The sixteenth value fills the room; one more costs three, an eighth of it and its own place.
        foreach (var key in (int[])[.. Enumerable.Range(1, Room), 1, Room + 1])
        {
            _ = _kept[key];
            WaitForTheClock();
        }

        _made.Clear();
        foreach (var key in (int[])[1, .. Enumerable.Range(5, Room - 3)]) _ = _kept[key];
        Assert.Empty(_made);
        foreach (var key in (int[])[2, 3]) _ = _kept[key];
        Assert.Equal([2, 3], _made);
    }

    [Fact]
    public void A_value_larger_than_all_room_is_still_given()
    {
        var kept = new RecentlyUsed<int, string>(Size, Make, static _ => 2 * Size);
        Assert.Equal("1", kept[1]);
        Assert.Equal("2", kept[2]);
        Assert.Equal(2 * Size, kept.Bytes);
    }

    [Fact]
    public void Many_workers_get_right_values_in_little_room()
    {
        Parallel.For(0, 20_000, i => Assert.Equal($"{i * 7 % 41}", _kept[i * 7 % 41]));
        Assert.InRange(_kept.Bytes, (Room - 2) * Size, Room * Size);
    }

    // The clock counts milliseconds.
    private static void WaitForTheClock()
    {
        var now = Environment.TickCount64;
        while (Environment.TickCount64 == now) Thread.Yield();
    }

    private string Make(int key)
    {
        lock (_made) _made.Add(key);
        return $"{key}";
    }
}
