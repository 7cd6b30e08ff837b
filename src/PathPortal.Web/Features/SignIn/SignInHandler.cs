using Microsoft.AspNetCore.Identity;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Web.Features.SignIn;

/// <summary>Checks a password and sets the session cookie.</summary>
public sealed class SignInHandler(SignInManager<Account> signIn, IPasswordHasher<Account> hasher)
{
    // One answer for a wrong password, an unknown address and a disabled account: it must not tell which addresses exist.
    private const string Refused = "That address and password do not belong together, or the account may not sign in.";
    private const string Locked = "Too many wrong passwords for this account. It opens again by itself after some minutes.";

    /// <summary>Null when the account is signed in; else what to say.</summary>
    public async Task<string?> SignInAsync(SignInForm form)
    {
        var account = await signIn.UserManager.FindByEmailAsync(form.Email.Trim());
        if (account is null)
        {
            // Takes as long as a real check, so that time does not tell either.
            hasher.HashPassword(new Account(form.Email, "", DateTimeOffset.UnixEpoch), form.Password);
            return Refused;
        }
        var result = await signIn.CheckPasswordSignInAsync(account, form.Password, lockoutOnFailure: true);
        if (result.IsLockedOut)
            return Locked;
        if (!result.Succeeded || account.DisabledAt is not null)
            return Refused;
        await signIn.SignInAsync(account, isPersistent: false);
        return null;
    }
}
