using System.Security.Cryptography;
using System.Text;

namespace PathPortal.Portal.Domain;

/// <summary>SHA-256 as 64 lower-case hexadecimal digits, the form in which every digest is stored and shown.</summary>
public static class Sha256Text
{
    public const int Length = 64;

    public static string Of(ReadOnlySpan<byte> bytes) => Convert.ToHexStringLower(SHA256.HashData(bytes));

    /// <summary>Digest of the text's UTF-8 bytes, without a byte-order mark.</summary>
    public static string Of(string text) => Of(Encoding.UTF8.GetBytes(text));

    public static string From(ReadOnlySpan<byte> digest) => digest.Length == 32
        ? Convert.ToHexStringLower(digest)
        : throw new ArgumentException("A SHA-256 has 32 bytes.", nameof(digest));
}
