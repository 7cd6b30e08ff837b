namespace PathPortal.Web.Hosting;

/// <summary>Marks the endpoints that serve files of the build: the same for everybody, signed in or not.</summary>
public sealed class StaticFileMark;
