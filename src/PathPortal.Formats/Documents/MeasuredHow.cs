namespace PathPortal.Formats.Documents;

/// <summary>How a frame or tool of a cell was obtained.</summary>
public enum MeasuredHow
{
    /// <summary>Taken from the drawing, not measured.</summary>
    Designed,

    /// <summary>Measured with an instrument that does not use this arm.</summary>
    Surveyed,

    /// <summary>Taught by touching points with this arm; absorbs much of the arm's own deviation.</summary>
    Taught,
}
