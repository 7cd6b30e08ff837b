using Microsoft.AspNetCore.Identity;
using Microsoft.EntityFrameworkCore;
using PathPortal.Portal.Data;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Handling.People;

/// <summary>Makes an account. Only a company administrator may, or a command at a terminal.</summary>
public sealed class CreateAccount(PortalDb db, IPasswordHasher<Account> hasher)
{
    public async Task<Outcome<Guid>> HandleAsync(
        Actor actor, string email, string displayName, string password, bool administersCompany, CancellationToken cancellation = default)
    {
        var address = EmailAddress.Parse(email);
        var name = Names.Name(displayName, "account");
        if (!address.Succeeded)
            return address.Refusal;
        if (!name.Succeeded)
            return name.Refusal;
        if (PasswordRules.Refuse(password, address.Value, name.Value) is { } weak)
            return new Refusal(RefusalKind.Invalid, weak);

        return await db.ActAsync<Guid>(actor, async session =>
        {
            if (actor.AccountId is not null && (await session.AccessAsync(cancellation)) is { AdministersCompany: false })
                return new Refusal(RefusalKind.NotAllowed, "Only a company administrator makes accounts.");
            var normalized = EmailAddress.Normalize(address.Value);
            if (await session.Db.Users.AnyAsync(a => a.NormalizedUserName == normalized, cancellation))
                return new Refusal(RefusalKind.Invalid, $"There is an account for {address.Value} already.");
            var account = new Account(address.Value, name.Value, session.Now)
            {
                NormalizedUserName = normalized,
                NormalizedEmail = normalized,
                EmailConfirmed = true,
                AdministersCompany = administersCompany,
            };
            account.PasswordHash = hasher.HashPassword(account, password);
            session.Db.Users.Add(account);
            session.Tell(HistoryDraft.Of(null, "account", account.Id, "created",
                ("email", account.Email), ("name", account.DisplayName), ("administers company", administersCompany ? "yes" : "no")));
            return account.Id;
        }, cancellation);
    }
}
