using System.Net;
using AngleSharp.Dom;
using AngleSharp.Html.Dom;
using AngleSharp.Html.Parser;

namespace PathPortal.Web.Tests.Support;

/// <summary>A browser without scripts: follows links, fills in forms, keeps cookies.</summary>
public sealed class Visitor(HttpClient client) : IDisposable
{
    private static readonly HtmlParser Parser = new();

    public HttpClient Client => client;

    public async Task<Answer> GetAsync(string path) => await ReadAsync(await client.GetAsync(new Uri(path, UriKind.Relative)));

    public async Task<Answer> SignInAsync(string email, string password = People.Password, string path = "/sign-in")
    {
        var page = await GetAsync(path);
        return await SubmitAsync(page, "main form", ("Form.Email", email), ("Form.Password", password));
    }

    /// <summary>Sends the form as the page gave it, with these fields filled in.</summary>
    public async Task<Answer> SubmitAsync(Answer page, string selector, params (string Name, string Value)[] fields)
    {
        var form = page.Document.QuerySelector(selector) as IHtmlFormElement ?? throw new InvalidOperationException($"{page.Path} has no form {selector}:\n{page.Text}");
        var values = FieldsOf(form);
        foreach (var (name, value) in fields)
            values[name] = value;
        return await PostAsync(form.GetAttribute("action") is { Length: > 0 } action ? action : page.Path, values);
    }

    public async Task<Answer> PostAsync(string path, IEnumerable<KeyValuePair<string, string>> fields)
    {
        using var content = new FormUrlEncodedContent(fields);
        return await ReadAsync(await client.PostAsync(new Uri(path, UriKind.Relative), content));
    }

    public async Task<Answer> SendAsync(HttpRequestMessage request) => await ReadAsync(await client.SendAsync(request));

    public static Dictionary<string, string> FieldsOf(IHtmlFormElement form)
    {
        var values = new Dictionary<string, string>();
        foreach (var field in form.QuerySelectorAll("input[name], select[name], textarea[name]"))
        {
            var value = field switch
            {
                IHtmlInputElement { Type: "checkbox" or "radio", IsChecked: false } => null,
                IHtmlInputElement { Type: "file" } => null,
                IHtmlInputElement input => input.Value,
                IHtmlSelectElement select => select.Value,
                IHtmlTextAreaElement area => area.Value,
                _ => null,
            };
            if (value is not null)
                values[field.GetAttribute("name")!] = value;
        }
        return values;
    }

    public void Dispose() => client.Dispose();

    private static async Task<Answer> ReadAsync(HttpResponseMessage response)
    {
        var body = await response.Content.ReadAsStringAsync();
        var isHtml = response.Content.Headers.ContentType?.MediaType == "text/html";
        return new Answer(response, response.RequestMessage!.RequestUri!.PathAndQuery, body, Parser.ParseDocument(isHtml ? body : ""));
    }

    public sealed record Answer(HttpResponseMessage Response, string Path, string Body, IDocument Document)
    {
        public HttpStatusCode Status => Response.StatusCode;

        public string? Location => Response.Headers.Location?.OriginalString;

        /// <summary>What stands in the main part of the page, blanks collapsed.</summary>
        public string Text => string.Join(' ', (Document.QuerySelector("main") ?? (INode?)Document.Body)?.TextContent.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries) ?? []);
    }
}
