var app = WebApplication.CreateBuilder(args).Build();
app.MapGet("/", () => "PathPortal");
await app.RunAsync();
