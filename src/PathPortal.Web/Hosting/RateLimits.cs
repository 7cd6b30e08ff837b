using System.Threading.RateLimiting;

namespace PathPortal.Web.Hosting;

/// <summary>Guessing is slowed per address, whatever account is guessed at; lockout per account is the identity system's.</summary>
public static class RateLimits
{
    /// <summary>Posts that carry a password: signing in, and confirming a decision.</summary>
    public const string Passwords = "passwords";

    public static IServiceCollection AddPortalRateLimits(this IServiceCollection services, IConfiguration configuration)
    {
        var perMinute = configuration.GetValue("SignIn:PostsPerMinute", 20);
        return services.AddRateLimiter(options =>
        {
            options.RejectionStatusCode = StatusCodes.Status429TooManyRequests;
            options.AddPolicy(Passwords, context => HttpMethods.IsPost(context.Request.Method)
                ? RateLimitPartition.GetSlidingWindowLimiter(context.Connection.RemoteIpAddress?.ToString() ?? "unknown", _ => new SlidingWindowRateLimiterOptions
                {
                    PermitLimit = perMinute,
                    Window = TimeSpan.FromMinutes(1),
                    SegmentsPerWindow = 6,
                    QueueLimit = 0,
                })
                : RateLimitPartition.GetNoLimiter("reading"));
        });
    }
}
