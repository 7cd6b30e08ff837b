using System.CommandLine;
using PathPortal.Cli;

var root = new RootCommand("Sets up and checks a PathPortal database. Connection strings come from the environment, so that no password shows in a process list.")
{
    MigrateCommand.Create(),
    CreateAdminCommand.Create(),
    VerifyCommand.Create(),
    LoadDemoCommand.Create(),
};
return await root.Parse(args).InvokeAsync();
