using System.Security.Cryptography;
using System.Text;
using Npgsql;

namespace PathPortal.TestSupport;

/// <summary>
/// The three roles of the portal on the tests' server. Roles belong to the whole server, so every test process must arrive at the same
/// passwords: they follow from the superuser's.
/// </summary>
internal sealed class TestRoles(string superuserConnectionString)
{
    private const string Owner = "pathportal_owner";
    private readonly NpgsqlConnectionStringBuilder _superuser = new(superuserConnectionString);

    public string Superuser(string database) => new NpgsqlConnectionStringBuilder(superuserConnectionString) { Database = database }.ConnectionString;

    public string OwnerOf(string database) => ConnectionString(Owner, database);

    public string Web(string database) => ConnectionString("pathportal_web", database);

    public string Worker(string database) => ConnectionString("pathportal_worker", database);

    /// <summary>Makes the owner, who may make the other two but is no superuser, as in a real installation.</summary>
    public async Task EnsureOwnerAsync(NpgsqlConnection superuser)
    {
        await using var command = superuser.CreateCommand();
        command.CommandText = $"""
            DO $$ BEGIN
                IF NOT EXISTS (SELECT FROM pg_roles WHERE rolname = '{Owner}') THEN
                    CREATE ROLE {Owner} LOGIN CREATEROLE PASSWORD '{Password(Owner)}';
                END IF;
            END $$
            """;
        await command.ExecuteNonQueryAsync();
    }

    private string ConnectionString(string role, string database) =>
        new NpgsqlConnectionStringBuilder
        {
            Host = _superuser.Host,
            Port = _superuser.Port,
            Database = database,
            Username = role,
            Password = Password(role),
        }.ConnectionString;

    private string Password(string role) =>
        Convert.ToHexStringLower(HMACSHA256.HashData(Encoding.UTF8.GetBytes(_superuser.Password ?? ""), Encoding.UTF8.GetBytes(role)));
}
