using System.Collections.Immutable;
using System.Diagnostics.CodeAnalysis;
using PathPortal.Formats.Paths;
using PathPortal.Formats.Problems;
using PathPortal.Portal.Domain;

namespace PathPortal.Portal.Handling.Programs;

/// <summary>What became of an uploaded file: kept, refused, or not readable. Only a kept one left anything behind.</summary>
public sealed record UploadResult
{
    public UploadedRevision? Revision { get; private init; }

    /// <summary>Why nothing was kept, whatever the reason; for a file with problems a summary of them.</summary>
    public Refusal? Refusal { get; private init; }

    /// <summary>What is wrong in the file, in its order; empty when it could be read.</summary>
    public ImmutableArray<FormatProblem> Problems { get; private init; } = [];

    /// <summary>“and N more” when not every problem is listed, else empty.</summary>
    public string MoreProblems { get; private init; } = "";

    /// <summary>What the reader remarked about a file that was kept.</summary>
    public ImmutableArray<FormatRemark> Remarks { get; private init; } = [];

    /// <summary>The kept file in figures.</summary>
    public PathReport? Report { get; private init; }

    [MemberNotNullWhen(true, nameof(Revision), nameof(Report))]
    [MemberNotNullWhen(false, nameof(Refusal))]
    public bool Succeeded => Revision is not null;

    internal static UploadResult Kept(UploadedRevision revision, ReadResult<PathFile> read) =>
        new() { Revision = revision, Report = read.Value!.Report, Remarks = read.Remarks };

    internal static UploadResult Refused(Refusal refusal) => new() { Refusal = refusal };

    internal static UploadResult Unreadable(ReadResult<PathFile> read) => new()
    {
        Refusal = new(RefusalKind.Invalid, "The file can't be used as it is; nothing was kept."),
        Problems = read.Problems,
        MoreProblems = read.MoreText,
    };
}
