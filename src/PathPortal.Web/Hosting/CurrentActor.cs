using System.Security.Claims;
using Microsoft.AspNetCore.Components.Authorization;
using PathPortal.Portal.Data;

namespace PathPortal.Web.Hosting;

/// <summary>Who acts on this page or in this circuit.</summary>
public sealed class CurrentActor(AuthenticationStateProvider state)
{
    public async Task<Actor> GetAsync() => Of((await state.GetAuthenticationStateAsync()).User);

    public static Actor Of(ClaimsPrincipal user) => Guid.TryParse(user.FindFirstValue(ClaimTypes.NameIdentifier), out var id)
        ? Actor.Of(id)
        : throw new InvalidOperationException("Nobody is signed in; the page should not have been reached.");
}
