namespace PathPortal.Formats.Paths;

/// <summary>Where one cell lies in the source: its content without quotes and outer blanks, and the place to name in messages.</summary>
/// <param name="Start">First byte of the content.</param>
/// <param name="Length">Bytes of the content.</param>
/// <param name="Quoted">The cell stood in quotes; doubled quotes inside are still doubled.</param>
/// <param name="Line">Line the cell starts on, from 1.</param>
/// <param name="LineStart">First byte of that line.</param>
/// <param name="At">Byte to point at: the opening quote of a quoted cell, else the content.</param>
internal readonly record struct CsvCell(int Start, int Length, bool Quoted, int Line, int LineStart, int At);
