namespace PathPortal.Portal.Data;

/// <summary>What a password must be. Length counts; required kinds of characters only make people write them down.</summary>
public static class PasswordRules
{
    public const int MinLength = 12;
    public const int MaxLength = 256;

    /// <summary>Why the password will not do; null when it will.</summary>
    public static string? Refuse(string password, string email, string displayName)
    {
        if (password.Length < MinLength)
            return $"The password has {password.Length} characters; at least {MinLength} are needed.";
        if (password.Length > MaxLength)
            return $"The password has {password.Length} characters; at most {MaxLength} are taken.";
        if (password.Distinct().Count() < 5)
            return "The password repeats too few characters.";
        if (IsSequence(password))
            return "The password is a plain sequence of characters.";
        string[] close = [email, email.Split('@')[0], displayName, "pathportal", .. displayName.Split(' ')];
        return close.FirstOrDefault(w => w.Length >= 4 && password.Contains(w, StringComparison.OrdinalIgnoreCase)
                && password.Length - w.Length < MinLength / 2) is { } word
            ? $"The password is little more than \"{word}\"."
            : null;
    }

    private static bool IsSequence(string text) =>
        Enumerable.Range(1, text.Length - 1).Select(i => text[i] - text[i - 1]).Distinct().Count() == 1;
}
