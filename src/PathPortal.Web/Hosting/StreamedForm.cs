using System.Buffers;
using Microsoft.AspNetCore.Antiforgery;
using Microsoft.AspNetCore.Http.Features;
using Microsoft.AspNetCore.WebUtilities;
using Microsoft.Net.Http.Headers;

namespace PathPortal.Web.Hosting;

/// <summary>
/// A posted form with one file, read as it comes: nothing beyond the limit is ever held in memory or on disk. The form's token has to be its
/// first field, so that a forged form is refused before its file is read.
/// </summary>
public sealed class StreamedForm
{
    private const int MaxFields = 8;
    private const int MaxFieldBytes = 16 * 1024;
    private const int MaxBoundaryLength = 100;

    // What is read and dropped after the limit, so that the browser gets to see the answer instead of a broken connection.
    private const long MaxDrained = 512L * 1024 * 1024;

    private readonly Dictionary<string, string> _fields = [];

    private StreamedForm()
    {
    }

    /// <summary>Null when the form could be read; else the status that says why not.</summary>
    public int? Refused { get; private set; }

    public string FileName { get; private set; } = "";

    /// <summary>Empty when no file was chosen.</summary>
    public byte[] File { get; private set; } = [];

    public string Field(string name) => _fields.GetValueOrDefault(name, "");

    public static async Task<StreamedForm> ReadAsync(HttpContext context, int maxFileBytes, CancellationToken cancellation)
    {
        if (context.Features.Get<IHttpMaxRequestBodySizeFeature>() is { IsReadOnly: false } limit)
            limit.MaxRequestBodySize = MaxDrained;
        var form = new StreamedForm();
        try
        {
            form.Refused = await form.FillAsync(context, maxFileBytes, cancellation);
        }
        catch (Exception e) when (e is InvalidDataException or IOException and not BadHttpRequestException)
        {
            form.Refused = StatusCodes.Status400BadRequest;
        }
        if (form.Refused is not null)
            await DrainAsync(context.Request.Body, cancellation);
        return form;
    }

    private async Task<int?> FillAsync(HttpContext context, int maxFileBytes, CancellationToken cancellation)
    {
        if (!MediaTypeHeaderValue.TryParse(context.Request.ContentType, out var type)
            || !type.MediaType.Equals("multipart/form-data", StringComparison.OrdinalIgnoreCase)
            || HeaderUtilities.RemoveQuotes(type.Boundary).Value is not { Length: > 0 and <= MaxBoundaryLength } boundary)
            return StatusCodes.Status400BadRequest;

        var trusted = false;
        var reader = new MultipartReader(boundary, context.Request.Body);
        while (await reader.ReadNextSectionAsync(cancellation) is { } section)
        {
            if (!ContentDispositionHeaderValue.TryParse(section.ContentDisposition, out var disposition) || !disposition.DispositionType.Equals("form-data"))
                return StatusCodes.Status400BadRequest;
            var name = HeaderUtilities.RemoveQuotes(disposition.Name).Value ?? "";
            var isFile = disposition.FileName.HasValue || disposition.FileNameStar.HasValue;
            if (!trusted)
            {
                if (isFile || await ReadFieldAsync(section.Body, cancellation) is not { } token || !await IsTrustedAsync(context, name, token))
                    return StatusCodes.Status400BadRequest;
                trusted = true;
            }
            else if (isFile)
            {
                FileName = HeaderUtilities.RemoveQuotes(disposition.FileNameStar.HasValue ? disposition.FileNameStar : disposition.FileName).Value ?? "";
                if (await ReadUpToAsync(section.Body, maxFileBytes, cancellation) is not { } bytes)
                    return StatusCodes.Status413PayloadTooLarge;
                File = bytes;
            }
            else if (_fields.Count >= MaxFields || await ReadFieldAsync(section.Body, cancellation) is not { } value)
            {
                return StatusCodes.Status400BadRequest;
            }
            else
            {
                _fields[name] = value;
            }
        }
        return trusted ? null : StatusCodes.Status400BadRequest;
    }

    private static async Task<bool> IsTrustedAsync(HttpContext context, string field, string token)
    {
        var antiforgery = context.RequestServices.GetRequiredService<IAntiforgery>();
        var names = antiforgery.GetTokens(context);
        if (field != names.FormFieldName || names.HeaderName is null)
            return false;
        // Read from the header, the token does not make the framework read the form.
        context.Request.Headers[names.HeaderName] = token;
        return await antiforgery.IsRequestValidAsync(context);
    }

    private static async Task<string?> ReadFieldAsync(Stream body, CancellationToken cancellation) =>
        await ReadUpToAsync(body, MaxFieldBytes, cancellation) is { } bytes ? System.Text.Encoding.UTF8.GetString(bytes) : null;

    /// <summary>The whole section, or null when it is longer.</summary>
    private static async Task<byte[]?> ReadUpToAsync(Stream body, int maxBytes, CancellationToken cancellation)
    {
        using var kept = new MemoryStream();
        var buffer = ArrayPool<byte>.Shared.Rent(64 * 1024);
        try
        {
            int read;
            while ((read = await body.ReadAsync(buffer, cancellation)) > 0)
            {
                if (kept.Length + read > maxBytes)
                    return null;
                kept.Write(buffer, 0, read);
            }
            return kept.ToArray();
        }
        finally
        {
            ArrayPool<byte>.Shared.Return(buffer);
        }
    }

    private static async Task DrainAsync(Stream body, CancellationToken cancellation)
    {
        var buffer = ArrayPool<byte>.Shared.Rent(64 * 1024);
        try
        {
            for (long drained = 0; drained < MaxDrained;)
            {
                var read = await body.ReadAsync(buffer, cancellation);
                if (read == 0)
                    return;
                drained += read;
            }
        }
        catch (IOException)
        {
            // The sender went away or sent more than is drained; the answer is the same.
        }
        finally
        {
            ArrayPool<byte>.Shared.Return(buffer);
        }
    }
}
