using System.Collections.Concurrent;

namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// Keeps what is computed from the models for one sort of spectra, for all workers and the next spectra of the sort. An archive may hold
/// any mixture of sorts: what was asked for longest ago makes room for others.
/// </summary>
/// <param name="mostBytes">Room for the values; one more may be there, and what somebody still works with.</param>
/// <param name="make">Makes a value; the same one for the same key, whoever asks.</param>
/// <param name="bytes">Size of a value.</param>
internal sealed class RecentlyUsed<TKey, TValue>(long mostBytes, Func<TKey, TValue> make, Func<TValue, long> bytes)
    where TKey : notnull
{
    private readonly ConcurrentDictionary<TKey, Slot> _slots = new();
    private readonly Lock _gate = new();
    private long _total;

    /// <summary>Size of all values that are kept.</summary>
    public long Bytes => Volatile.Read(ref _total);

    /// <summary>The value of a key, made where it is not kept.</summary>
    public TValue this[TKey key]
    {
        get
        {
            if (!_slots.TryGetValue(key, out var slot)) slot = Add(key, new(make(key)));
            slot.LastUse = Environment.TickCount64;
            return slot.Value;
        }
    }

    private Slot Add(TKey key, Slot slot)
    {
        lock (_gate)
        {
            // Two workers may have made it at the same time.
            if (!_slots.TryAdd(key, slot)) return slot;
            _total += bytes(slot.Value);
            if (_total > mostBytes) MakeRoom(key);
        }

        return slot;
    }

    // An eighth at a time, as putting the values in order costs more than making room for one.
    private void MakeRoom(TKey newest)
    {
        var most = mostBytes - mostBytes / 8;
        foreach (var (key, slot) in _slots.OrderBy(static pair => pair.Value.LastUse))
        {
            if (_total <= most) return;
            if (key.Equals(newest) || !_slots.TryRemove(key, out _)) continue;
            _total -= bytes(slot.Value);
        }
    }

    private sealed class Slot(TValue value)
    {
        public TValue Value => value;

        /// <summary>Milliseconds of the system's clock.</summary>
        public long LastUse { get; set; } = Environment.TickCount64;
    }
}
