namespace PathPortal.Portal.Jobs;

/// <summary>What a worker does beside its jobs.</summary>
internal sealed record JobWorkerParts(WorkerHeartbeat Heartbeat, RunReconciler Reconciler, WorkerStop Stop, JobWorkerOptions Options);
