namespace PathPortal.Formats.Problems;

/// <summary>How much of anything the readers take or tell.</summary>
public static class ReadLimits
{
    /// <summary>Problems listed one by one; further ones are only counted.</summary>
    public const int ListedProblems = 50;

    /// <summary>Remarks listed one by one.</summary>
    public const int ListedRemarks = 50;

    /// <summary>Largest path file (bytes).</summary>
    public const int PathBytes = 32 * 1024 * 1024;

    /// <summary>Most points in one path.</summary>
    public const int PathPoints = 200_000;

    /// <summary>Largest arm, cell-setup or criteria document (bytes).</summary>
    public const int DocumentBytes = 1024 * 1024;

    /// <summary>Largest URDF file (bytes).</summary>
    public const int UrdfBytes = 8 * 1024 * 1024;
}
