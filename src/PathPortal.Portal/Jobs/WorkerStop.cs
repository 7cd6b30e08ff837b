namespace PathPortal.Portal.Jobs;

/// <summary>
/// How a worker ends: first it takes no more runs and finishes the one it computes; when that takes too long, it gives the run back.
/// </summary>
internal sealed class WorkerStop : IDisposable
{
    private readonly CancellationTokenSource _noMore = new();
    private readonly CancellationTokenSource _now = new();
    private int _jobs;

    /// <summary>Cancelled when no further run is to be taken.</summary>
    public CancellationToken NoMore => _noMore.Token;

    /// <summary>Cancelled when the running computation is to be given up too.</summary>
    public CancellationToken Now => _now.Token;

    /// <summary>True while a job is at work, giving back included.</summary>
    public bool IsBusy => Volatile.Read(ref _jobs) > 0;

    public void JobBegins() => Interlocked.Increment(ref _jobs);

    public void JobEnds() => Interlocked.Decrement(ref _jobs);

    public void TakeNoMore() => _noMore.Cancel();

    public void GiveUp() => _now.Cancel();

    public void Dispose()
    {
        _noMore.Dispose();
        _now.Dispose();
    }
}
