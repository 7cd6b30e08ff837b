using System.Security.Claims;
using Microsoft.AspNetCore.Identity;
using Microsoft.Extensions.Options;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Web.Hosting;

/// <summary>Puts the name people know into the session. Roles are not in it: they are read where something is done.</summary>
public sealed class AccountPrincipalFactory(UserManager<Account> accounts, IOptions<IdentityOptions> options)
    : UserClaimsPrincipalFactory<Account>(accounts, options)
{
    protected override async Task<ClaimsIdentity> GenerateClaimsAsync(Account user)
    {
        var identity = await base.GenerateClaimsAsync(user);
        identity.AddClaim(new Claim(AccountClaims.DisplayName, user.DisplayName));
        return identity;
    }
}
