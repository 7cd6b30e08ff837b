namespace PathPortal.Web.Features.SignIn;

public sealed class SignInForm
{
    public string Email { get; set; } = "";

    public string Password { get; set; } = "";
}
