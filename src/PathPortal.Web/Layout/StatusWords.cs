namespace PathPortal.Web.Layout;

/// <summary>What a status code means to the person who meets it.</summary>
public static class StatusWords
{
    public static string Title(int code) => code switch
    {
        400 => "The form was not accepted",
        403 => "Not yours to do",
        404 => "There is nothing at this address",
        413 => "The file is too large",
        429 => "Too many attempts",
        503 => "The database does not answer",
        _ => "Something went wrong here",
    };

    public static string Text(int code) => code switch
    {
        400 => "It was incomplete, too old, or came from another page. Nothing was changed. Load the page again and repeat it.",
        403 => "Your account has no role that allows this. Nothing was changed. Whoever administers the plant can give you one.",
        404 => "The link may be old, or it leads to something of a plant your account does not belong to. The portal answers both the same way.",
        413 => "The portal takes files of 32 MiB and 200 000 waypoints at most. Nothing was stored.",
        429 => "This address sent a password too often within a minute. Wait a minute, then try again.",
        503 => "The portal runs, but its database did not answer in time. Nothing you saved before is lost; what you just did was not stored. "
            + "The portal comes back by itself as soon as the database does.",
        _ => "The portal could not finish this; what you just did was not stored. If it happens again, tell your administrator.",
    };
}
