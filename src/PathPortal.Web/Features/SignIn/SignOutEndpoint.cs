using Microsoft.AspNetCore.Identity;
using Microsoft.AspNetCore.Mvc;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Web.Features.SignIn;

public static class SignOutEndpoint
{
    // The parameter from the form makes the framework check the antiforgery token.
    public static void MapSignOut(this IEndpointRouteBuilder routes) =>
        routes.MapPost("/account/sign-out", async (SignInManager<Account> signIn, [FromForm] string? reason) =>
        {
            await signIn.SignOutAsync();
            return Results.LocalRedirect("/sign-in");
        }).AllowAnonymous();
}
