using System.CommandLine;
using System.Globalization;
using PathPortal.Portal.Data;
using PathPortal.Portal.Handling.History;

namespace PathPortal.Cli;

/// <summary>Follows the history's chain and says where it breaks.</summary>
internal static class VerifyCommand
{
    public static Command Create()
    {
        var checkpoints = new Option<string[]>("--checkpoint")
        {
            Description = "A sequence and its hash from a record kept elsewhere, as 120:9f86d0…; may be given several times.",
        };
        var command = new Command("verify", "Checks that the history is whole. Without checkpoints kept elsewhere, a chain that was rebuilt from its beginning can't be told from the true one.")
        {
            checkpoints,
        };
        command.SetAction((parsed, cancellation) => Terminal.RunAsync(async () =>
        {
            var known = (parsed.GetValue(checkpoints) ?? []).Select(Parse).ToDictionary(c => c.Sequence, c => c.Hash);
            await using var database = await OwnerDatabase.OpenAsync(cancellation);
            var report = await new VerifyHistory(database.Db).HandleAsync(Actor.Process("verify"), known, cancellation);
            if (report.Break is { } broken)
            {
                return Terminal.Fail(string.Create(CultureInfo.InvariantCulture,
                    $"The history breaks at entry {broken.Sequence}: {broken.Reason}. The {report.Count} entries before hold."));
            }
            Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"The history holds: {report.Count} entries. Keep elsewhere: {report.Count}:{report.LastHash}"));
            return Terminal.Done;
        }));
        return command;
    }

    private static (long Sequence, string Hash) Parse(string text)
    {
        var parts = text.Split(':');
        return parts.Length == 2 && long.TryParse(parts[0], NumberStyles.None, CultureInfo.InvariantCulture, out var sequence) && parts[1].Length == 64
            ? (sequence, parts[1].ToLowerInvariant())
            : throw new CommandException($"“{text}” is no checkpoint: a sequence, a colon and 64 hexadecimal digits are expected.");
    }
}
