namespace PathPortal.Web.Shared;

public sealed record Crumb(string Text, string Href);
