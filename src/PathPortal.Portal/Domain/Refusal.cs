namespace PathPortal.Portal.Domain;

/// <summary>Why something was not done, in a sentence a person can act on.</summary>
public sealed record Refusal(RefusalKind Kind, string Message)
{
    /// <summary>Also the answer for things the asker may not see: whether they exist is not told.</summary>
    public static Refusal NotFound(string what) => new(RefusalKind.NotFound, $"No such {what}.");
}
