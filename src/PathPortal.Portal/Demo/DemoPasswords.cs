using System.Security.Cryptography;
using System.Text;

namespace PathPortal.Portal.Demo;

/// <summary>The file with the passwords of the demo accounts: one line each, readable by its owner alone.</summary>
internal sealed class DemoPasswords
{
    // Without characters that are mistaken for one another.
    private const string Alphabet = "abcdefghjkmnpqrstuvwxyz23456789";
    private const int Groups = 4;
    private const int GroupLength = 5;

    private readonly string _path;
    private readonly Dictionary<string, string> _byEmail;

    private DemoPasswords(string path, Dictionary<string, string> byEmail)
    {
        _path = path;
        _byEmail = byEmail;
    }

    /// <summary>Reads the file if it is there; lines it does not understand are left out.</summary>
    public static DemoPasswords Read(string path)
    {
        var lines = File.Exists(path) ? File.ReadAllLines(path) : [];
        return new(path, lines.Where(l => !l.StartsWith('#')).Select(l => l.Split(' ', StringSplitOptions.RemoveEmptyEntries))
            .Where(w => w.Length >= 2).GroupBy(w => w[0]).ToDictionary(g => g.Key, g => g.First()[1]));
    }

    /// <summary>The password the file knows; null when it knows none.</summary>
    public string? Find(string email) => _byEmail.GetValueOrDefault(email);

    public string Create(string email) => _byEmail[email] = string.Join('-',
        Enumerable.Range(0, Groups).Select(_ => RandomNumberGenerator.GetString(Alphabet, GroupLength)));

    /// <summary>Replaces the file in one step. It must stand before the accounts do: a lost password would be worse than one too many.</summary>
    public void Save(IEnumerable<DemoPerson> people)
    {
        var text = new StringBuilder("# Accounts of the invented demo company. Sign in with address and password.\n");
        foreach (var person in people.Where(p => _byEmail.ContainsKey(p.Email)))
            text.Append(person.Email.PadRight(24)).Append(_byEmail[person.Email].PadRight(28)).Append(person.About).Append('\n');
        var fresh = _path + ".new";
        File.Delete(fresh);
        var options = new FileStreamOptions { Mode = FileMode.CreateNew, Access = FileAccess.Write };
        if (!OperatingSystem.IsWindows())
            options.UnixCreateMode = UnixFileMode.UserRead | UnixFileMode.UserWrite;
        using (var file = new FileStream(fresh, options))
        {
            file.Write(Encoding.UTF8.GetBytes(text.ToString()));
            file.Flush(flushToDisk: true);
        }
        File.Move(fresh, _path, overwrite: true);
    }
}
