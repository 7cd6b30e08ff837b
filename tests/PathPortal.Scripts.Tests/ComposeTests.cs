using System.Text.RegularExpressions;
using Npgsql;
using PathPortal.TestSupport;

namespace PathPortal.Scripts.Tests;

/// <summary>What can be said of the container files without a container engine.</summary>
public sealed partial class ComposeTests
{
    private static readonly Dictionary<string, string> Passwords = new()
    {
        ["PATHPORTAL_DB_PASSWORD"] = "secret-of-db",
        ["PATHPORTAL_OWNER_PASSWORD"] = "secret-of-owner",
        ["PATHPORTAL_WEB_PASSWORD"] = "secret-of-web",
        ["PATHPORTAL_WORKER_PASSWORD"] = "secret-of-worker",
    };

    public static TheoryData<string> PasswordNames => [.. Passwords.Keys];

    [Theory]
    [MemberData(nameof(PasswordNames))]
    public async Task Config_WithoutOnePassword_IsRefused(string missing)
    {
        var environment = new Dictionary<string, string>(Passwords) { [missing] = "" };

        var result = await ComposeAsync(environment, "config");

        Assert.NotEqual(0, result.ExitCode);
        Assert.Contains(missing, result.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Config_EachService_KnowsOnlyItsOwnPasswords()
    {
        var result = await ComposeAsync(Passwords, "config");

        Assert.True(result.ExitCode == 0, result.Error);
        var services = Services(result.Output);
        Assert.Equal(["db", "migrate", "web", "worker"], services.Keys.Order());
        Assert.Equal(["db", "owner"], SecretsIn(services["db"]));
        Assert.Equal(["owner", "web", "worker"], SecretsIn(services["migrate"]));
        Assert.Equal(["web"], SecretsIn(services["web"]));
        Assert.Equal(["worker"], SecretsIn(services["worker"]));
        Assert.DoesNotContain("container_name", result.Output, StringComparison.Ordinal);
        Assert.DoesNotContain("ports:", services["worker"], StringComparison.Ordinal);
    }

    [Fact]
    public async Task ComposeFile_EveryVariable_HasNoDefaultUnlessItIsThePort()
    {
        var text = await File.ReadAllTextAsync(Path.Combine(TestPaths.RepositoryRoot, "docker-compose.yml"), TestContext.Current.CancellationToken);

        var variables = VariablePattern().Matches(text).Select(match => match.Value).ToArray();

        Assert.NotEmpty(variables);
        Assert.All(variables, variable => Assert.True(variable.Contains(":?", StringComparison.Ordinal) || variable == "${PATHPORTAL_PORT:-8080}", variable));
    }

    [Fact]
    public async Task CreateOwner_OnAFreshCluster_MakesAnOwnerThatIsNoSuperuser()
    {
        if (!Command.Exists("psql"))
            Assert.Skip("psql is not on this machine; the script runs inside the database's image, which has it.");
        await using var server = await PrivatePostgres.StartAsync(TestContext.Current.CancellationToken);
        var superuser = new NpgsqlConnectionStringBuilder(server.ConnectionString);
        var environment = new Dictionary<string, string>
        {
            ["PGHOST"] = superuser.Host!,
            ["PGPORT"] = $"{superuser.Port}",
            ["PGPASSWORD"] = superuser.Password!,
            ["PATHPORTAL_OWNER_PASSWORD"] = "it's-quoted",
        };

        var result = await Command.RunAsync(".docker/create-owner.sh", [], environment);

        Assert.True(result.ExitCode == 0, result.Error);
        superuser.Username = "pathportal_owner";
        superuser.Password = "it's-quoted";
        superuser.Database = "pathportal";
        await using var owner = new NpgsqlConnection(superuser.ConnectionString);
        await owner.OpenAsync(TestContext.Current.CancellationToken);
        await using var command = new NpgsqlCommand("SELECT rolsuper, rolcreaterole FROM pg_roles WHERE rolname = current_user", owner);
        await using var row = await command.ExecuteReaderAsync(TestContext.Current.CancellationToken);
        Assert.True(await row.ReadAsync(TestContext.Current.CancellationToken));
        Assert.Equal((false, true), (row.GetBoolean(0), row.GetBoolean(1)));
    }

    private static async Task<Command> ComposeAsync(Dictionary<string, string> environment, params string[] arguments)
    {
        if (Command.Exists("docker") && (await Command.RunAsync("docker", ["compose", "version"])).ExitCode == 0)
            return await Command.RunAsync("docker", ["compose", .. arguments], environment);
        if (!Command.Exists("docker-compose"))
            Assert.Skip("No compose client on this machine (package docker-compose).");
        return await Command.RunAsync("docker-compose", arguments, environment);
    }

    private static Dictionary<string, string> Services(string config)
    {
        var services = new Dictionary<string, string>();
        var current = "";
        foreach (var line in config.Split('\n').SkipWhile(line => line != "services:").Skip(1).TakeWhile(line => line.StartsWith(' ')))
        {
            if (line[2] != ' ')
                services[current = line.Trim(' ', ':')] = "";
            services[current] += line + "\n";
        }

        return services;
    }

    private static string[] SecretsIn(string service) => [.. SecretPattern().Matches(service).Select(match => match.Groups[1].Value).Distinct().Order()];

    [GeneratedRegex(@"\$\{[^}]*\}")]
    private static partial Regex VariablePattern();

    [GeneratedRegex("secret-of-([a-z]+)")]
    private static partial Regex SecretPattern();
}
