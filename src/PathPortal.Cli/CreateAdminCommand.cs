using System.CommandLine;
using PathPortal.Portal.Data;
using PathPortal.Portal.Handling.People;

namespace PathPortal.Cli;

/// <summary>Makes the first account: it may found plants, make accounts and give roles.</summary>
internal static class CreateAdminCommand
{
    public static Command Create()
    {
        var email = new Option<string>("--email") { Required = true, Description = "The address to sign in with." };
        var name = new Option<string?>("--name") { Description = "The name shown to others; the address when left out." };
        var command = new Command("create-admin", $"Makes an account that administers the company. The password is asked for, or read from standard input; at least {PasswordRules.MinLength} characters.")
        {
            email,
            name,
        };
        command.SetAction((parsed, cancellation) => Terminal.RunAsync(async () =>
        {
            var address = parsed.GetRequiredValue(email);
            await using var database = await OwnerDatabase.OpenAsync(cancellation);
            var password = Terminal.ReadSecret("Password: ");
            if (!Console.IsInputRedirected && Terminal.ReadSecret("Once more: ") != password)
                return Terminal.Fail("The two passwords differ.");
            var outcome = await new CreateAccount(database.Db, PortalData.CreateHasher()).HandleAsync(
                Actor.Process("create-admin"), address, parsed.GetValue(name) ?? address, password, administersCompany: true, cancellation);
            if (!outcome.Succeeded)
                return Terminal.Fail(outcome.Refusal.Message);
            Console.WriteLine($"{address} can sign in and administers the company.");
            return Terminal.Done;
        }));
        return command;
    }
}
