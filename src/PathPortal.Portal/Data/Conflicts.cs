using Microsoft.EntityFrameworkCore;
using Npgsql;
using PathPortal.Portal.Domain;

namespace PathPortal.Portal.Data;

/// <summary>Which of the database's complaints mean that somebody else was faster, and which that a rule would be broken.</summary>
internal static class Conflicts
{
    // Raised by the portal's own triggers.
    public const string FourEyesState = "PP001";
    public const string OrderState = "PP002";

    public static bool MayTryAgain(Exception e) => e is DbUpdateConcurrencyException || StateOf(e) is
        PostgresErrorCodes.SerializationFailure or PostgresErrorCodes.DeadlockDetected or PostgresErrorCodes.UniqueViolation
        or PostgresErrorCodes.LockNotAvailable;

    public static Refusal? BrokenRule(Exception e) => Find(e) switch
    {
        { SqlState: FourEyesState } broken => new(RefusalKind.FourEyes, broken.MessageText),
        { SqlState: PostgresErrorCodes.CheckViolation, ConstraintName: "ck_decisions_four_eyes" } =>
            new(RefusalKind.FourEyes, "Somebody who neither uploaded nor submitted the revision has to decide on it."),
        { SqlState: OrderState } broken => new(RefusalKind.WrongState, broken.MessageText),
        _ => null,
    };

    public static bool LostConnection(Exception e) =>
        e is NpgsqlException and not PostgresException || e.InnerException is NpgsqlException and not PostgresException
        || StateOf(e) is PostgresErrorCodes.AdminShutdown or PostgresErrorCodes.CrashShutdown;

    private static string? StateOf(Exception e) => Find(e)?.SqlState;

    private static PostgresException? Find(Exception? e)
    {
        for (; e is not null; e = e.InnerException)
        {
            if (e is PostgresException found)
                return found;
        }
        return null;
    }
}
