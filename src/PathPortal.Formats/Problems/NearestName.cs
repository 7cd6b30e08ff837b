namespace PathPortal.Formats.Problems;

/// <summary>Finds the known name somebody probably meant.</summary>
internal static class NearestName
{
    /// <summary>The known name with the fewest edits to the given one, when there are few enough; else null.</summary>
    public static string? Of(string given, IEnumerable<string> known)
    {
        if (given.Length is 0 or > 64)
        {
            return null;
        }

        var best = int.MaxValue;
        string? nearest = null;
        foreach (var name in known)
        {
            var edits = Edits(given.ToLowerInvariant(), name);
            if (edits < best)
            {
                (best, nearest) = (edits, name);
            }
        }

        return nearest is not null && best <= Math.Max(1, Math.Max(given.Length, nearest.Length) / 3) ? nearest : null;
    }

    /// <summary>“did you mean” as the end of an expectation, or the list of names when it is short.</summary>
    public static string Hint(string given, IReadOnlyCollection<string> known) => Of(given, known) is { } nearest
        ? $"a known name; nearest is “{nearest}”"
        : "one of " + string.Join(", ", known);

    // Optimal string alignment distance: inserts, deletes, replacements and swaps of neighbours cost one each (Damerau 1964, Levenshtein 1966).
    private static int Edits(string a, string b)
    {
        var rows = new int[a.Length + 1, b.Length + 1];
        for (var i = 0; i <= a.Length; i++)
        {
            rows[i, 0] = i;
        }

        for (var j = 0; j <= b.Length; j++)
        {
            rows[0, j] = j;
        }

        for (var i = 1; i <= a.Length; i++)
        {
            for (var j = 1; j <= b.Length; j++)
            {
                var cost = a[i - 1] == b[j - 1] ? 0 : 1;
                var least = Math.Min(Math.Min(rows[i - 1, j], rows[i, j - 1]) + 1, rows[i - 1, j - 1] + cost);
                if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                {
                    least = Math.Min(least, rows[i - 2, j - 2] + 1);
                }

                rows[i, j] = least;
            }
        }

        return rows[a.Length, b.Length];
    }
}
