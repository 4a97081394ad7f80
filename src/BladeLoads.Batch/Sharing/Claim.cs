using BladeLoads.Results.Publishing;

namespace BladeLoads.Batch.Sharing;

/// <summary>The right to solve a case, held by this process alone until it ends or says what came of it.</summary>
/// <remarks>
/// An attempt counts when it begins and is taken off again when it ends in whatever orderly way: so what is left counts processes that
/// were lost, and a case that kills its process cannot come back for ever. A power cut seldom counts, since nothing here is flushed.
/// </remarks>
public sealed class Claim
{
    private readonly ILockedFile _held;
    private readonly string _fingerprint;
    private readonly Action _delete;
    private readonly Action<Claim> _ended;
    private readonly Lock _lock = new();
    private bool _hasEnded;

    internal Claim(ILockedFile held, string fingerprint, Action delete, Action<Claim> ended)
    {
        (_held, _fingerprint, _delete, _ended) = (held, fingerprint, delete, ended);
        var note = ClaimNote.Parse(held.Read());
        LostAttempts = note.Fingerprint == fingerprint ? note.Attempts : 0;
    }

    /// <summary>How often a process was lost while it solved the case with these values.</summary>
    public int LostAttempts { get; }

    /// <summary>Counts an attempt: the case is solved from here on.</summary>
    /// <exception cref="IOException">The system refused.</exception>
    public void Begin()
    {
        lock (_lock)
            if (!_hasEnded)
                _held.Write(new ClaimNote(_fingerprint, LostAttempts + 1, Environment.ProcessId).ToBytes());
    }

    /// <summary>The case is solved, or has failed for a reason of its own: nothing need be remembered.</summary>
    public void Done() => End(_delete);

    /// <summary>The case was not solved, for a reason that is not its own: all is as before.</summary>
    public void GiveBack()
        => End(LostAttempts == 0 ? _delete : () => _held.Write(new ClaimNote(_fingerprint, LostAttempts, null).ToBytes()));

    private void End(Action lastWord)
    {
        lock (_lock)
        {
            if (_hasEnded)
                return;
            _hasEnded = true;
            try
            {
                lastWord();
            }
            catch (Exception e) when (e is IOException or UnauthorizedAccessException)
            {
                // It stays behind, unlocked: the next run removes it if the result is there, or counts one attempt too many.
            }
            finally
            {
                _held.Dispose();
                _ended(this);
            }
        }
    }
}
