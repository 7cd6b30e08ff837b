using System.Net.Sockets;
using Npgsql;

namespace PathPortal.Cli;

/// <summary>Runs a command so that every expected trouble ends in one line on standard error and a code that scripts can test.</summary>
internal static class Terminal
{
    public const int Done = 0;
    public const int Failed = 1;

    public static async Task<int> RunAsync(Func<Task<int>> command)
    {
        try
        {
            return await command();
        }
        catch (CommandException e)
        {
            return Fail(e.Message);
        }
        catch (PostgresException e)
        {
            return Fail($"The database refused: {e.MessageText}");
        }
        catch (NpgsqlException e)
        {
            return Fail($"The database does not answer: {e.Message}");
        }
        catch (Exception e) when (e is SocketException or IOException or UnauthorizedAccessException or ArgumentException or InvalidOperationException)
        {
            return Fail(e.Message);
        }
        catch (OperationCanceledException)
        {
            return Fail("Stopped.");
        }
    }

    public static int Fail(string message)
    {
        Console.Error.WriteLine(message.ReplaceLineEndings(" "));
        return Failed;
    }

    /// <summary>Asks without echo on a terminal; else takes the first line of standard input.</summary>
    public static string ReadSecret(string prompt)
    {
        if (Console.IsInputRedirected)
            return Console.In.ReadLine() ?? "";
        Console.Error.Write(prompt);
        var typed = new System.Text.StringBuilder();
        while (true)
        {
            var key = Console.ReadKey(intercept: true);
            if (key.Key == ConsoleKey.Enter)
                break;
            if (key.Key == ConsoleKey.Backspace)
                typed.Length = Math.Max(0, typed.Length - 1);
            else if (!char.IsControl(key.KeyChar))
                typed.Append(key.KeyChar);
        }
        Console.Error.WriteLine();
        return typed.ToString();
    }
}
