namespace Redshift.Pipeline.Tests.Ledger;

/// <summary>A clock that stands still until it is told otherwise.</summary>
internal sealed class HandSetClock : TimeProvider
{
    private readonly Lock _gate = new();
    private readonly List<HandSetTimer> _timers = [];
    private long _now;

    public override long TimestampFrequency => TimeSpan.TicksPerSecond;

    public override long GetTimestamp() => Interlocked.Read(ref _now);

    /// <summary>Time passes, and the timers that are due ring.</summary>
    public void Pass(TimeSpan time)
    {
        var now = Interlocked.Add(ref _now, time.Ticks);
        List<HandSetTimer> due;
        lock (_gate)
        {
            due = _timers.FindAll(timer => timer.Due <= now);
            _timers.RemoveAll(due.Contains);
        }

        due.ForEach(static timer => timer.Ring());
    }

    public override ITimer CreateTimer(TimerCallback callback, object? state, TimeSpan dueTime, TimeSpan period)
    {
        var timer = new HandSetTimer(callback, state, GetTimestamp() + dueTime.Ticks);
        lock (_gate) _timers.Add(timer);
        return timer;
    }

    private sealed class HandSetTimer(TimerCallback callback, object? state, long due) : ITimer
    {
        public long Due => due;

        public void Ring() => callback(state);

        public bool Change(TimeSpan dueTime, TimeSpan period) => throw new NotSupportedException();

        public void Dispose()
        {
        }

        public ValueTask DisposeAsync() => ValueTask.CompletedTask;
    }
}
