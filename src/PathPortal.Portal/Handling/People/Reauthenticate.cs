using Microsoft.AspNetCore.Identity;
using Microsoft.EntityFrameworkCore;
using Microsoft.Extensions.Options;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Reviews;

namespace PathPortal.Portal.Handling.People;

/// <summary>Checks the acting account's password once more, for one decision. Wrong ones count towards the same lockout as at the sign-in.</summary>
public sealed class Reauthenticate(PortalDb db, IPasswordHasher<Account> hasher, IOptions<IdentityOptions> options)
{
    public async Task<Outcome<Reauthentication>> HandleAsync(Actor actor, string password, CancellationToken cancellation = default)
    {
        await using var session = await db.OpenAsync(actor, cancellation);
        // One guess at a time: the row stays locked until the count is written.
        var account = await session.Db.Users.FromSql($"SELECT * FROM accounts WHERE id = {actor.AccountId} FOR UPDATE").SingleOrDefaultAsync(cancellation);
        if (account is null || account.DisabledAt is not null)
            return new Refusal(RefusalKind.NotAllowed, "This account is disabled.");
        if (account.LockoutEnd > session.Now)
            return new Refusal(RefusalKind.NotReauthenticated, "Too many wrong passwords; wait a few minutes.");
        if (account.PasswordHash is null)
            return new Refusal(RefusalKind.NotReauthenticated, "This account has no password; sign in again with the identity provider.");

        if (password.Length <= PasswordRules.MaxLength
            && hasher.VerifyHashedPassword(account, account.PasswordHash, password) != PasswordVerificationResult.Failed)
        {
            account.AccessFailedCount = 0;
            await session.CommitAsync(cancellation);
            return new Reauthentication(account.Id, "password", session.Now);
        }
        account.AccessFailedCount++;
        if (account.AccessFailedCount >= options.Value.Lockout.MaxFailedAccessAttempts)
        {
            account.AccessFailedCount = 0;
            account.LockoutEnd = session.Now + options.Value.Lockout.DefaultLockoutTimeSpan;
        }
        await session.CommitAsync(cancellation);
        return new Refusal(RefusalKind.NotReauthenticated, "That is not your password.");
    }
}
