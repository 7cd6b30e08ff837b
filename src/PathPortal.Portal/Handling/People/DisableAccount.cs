using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.History;

namespace PathPortal.Portal.Handling.People;

/// <summary>Stops an account from acting at once, or lets it act again. Its past stays as it is.</summary>
public sealed class DisableAccount(PortalDb db)
{
    /// <returns>True when something changed.</returns>
    public async Task<Outcome<bool>> HandleAsync(Actor actor, Guid accountId, bool disabled, CancellationToken cancellation = default) =>
        await db.ActAsync<bool>(actor, async session =>
        {
            var access = await session.AccessAsync(cancellation);
            if (!access.AdministersCompany)
                return new Refusal(RefusalKind.NotAllowed, "Only a company administrator disables accounts.");
            if (access.AccountId == accountId)
                return new Refusal(RefusalKind.FourEyes, "Nobody disables their own account; another administrator has to.");
            var account = await session.Db.Users.SingleOrDefaultAsync(a => a.Id == accountId, cancellation);
            if (account is null)
                return Refusal.NotFound("account");
            if (account.DisabledAt is not null == disabled)
                return false;
            if (disabled)
                account.Disable(session.Now);
            else
                account.Enable();
            session.Tell(HistoryDraft.Of(null, "account", accountId, disabled ? "disabled" : "enabled",
                ("account", account.DisplayName), ("email", account.Email)));
            return true;
        }, cancellation);
}
