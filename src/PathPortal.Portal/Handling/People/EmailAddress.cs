using System.Net.Mail;
using PathPortal.Formats.Problems;
using PathPortal.Portal.Domain;

namespace PathPortal.Portal.Handling.People;

/// <summary>The address an account signs in with.</summary>
public static class EmailAddress
{
    private const int MaxLength = 254;

    /// <summary>The trimmed address, or why it is none.</summary>
    public static Outcome<string> Parse(string? text)
    {
        var trimmed = (text ?? "").Trim();
        return trimmed.Length <= MaxLength && VisibleText.FirstHidden(trimmed) < 0 && !trimmed.Contains(' ')
            && MailAddress.TryCreate(trimmed, out var address) && address.Address == trimmed
            ? trimmed
            : new Refusal(RefusalKind.Invalid, $"“{VisibleText.Of(trimmed)}” is no e-mail address.");
    }

    /// <summary>The form in which addresses are compared, the same as the sign-in's.</summary>
    public static string Normalize(string email) => email.Normalize().ToUpperInvariant();
}
