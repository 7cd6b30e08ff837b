namespace PathPortal.Web.Shared;

/// <summary>The steps of the limit-use scale, from far below to over.</summary>
public enum LimitUseBand
{
    NotAssessable,
    Step0,
    Step1,
    Step2,
    Step3,
    Near,
    Over,
}
