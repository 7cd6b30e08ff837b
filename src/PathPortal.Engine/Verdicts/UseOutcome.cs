using PathPortal.Engine.Measures;

namespace PathPortal.Engine.Verdicts;

/// <summary>The outcome of a criterion from its use at every sample.</summary>
internal static class UseOutcome
{
    public static CriterionOutcome Of(CriteriaSheet criteria, LimitMeasure measure, double[] use, RunSamples samples)
    {
        var near = Judgement.NearOf(criteria, measure.Criterion);
        var worst = -1;
        for (var k = 0; k < use.Length; k++)
        {
            worst = UseRules.IsWorse(use[k], worst < 0 ? double.NaN : use[worst]) ? k : worst;
        }

        if (worst < 0)
        {
            return new()
            {
                Criterion = measure.Criterion,
                Status = CriterionStatus.NotAssessable,
                Binding = Judgement.Binds(criteria, measure.Criterion),
                NearThreshold = near,
                Reason = measure.MissingLimit ?? measure.NoSampleReason,
            };
        }

        // A limit that was not given can't be held, but one that was given can be broken.
        var status = UseRules.StatusOf(use[worst], near);
        if (status != CriterionStatus.Fail && measure.MissingLimit is not null)
        {
            status = CriterionStatus.NotAssessable;
        }

        var detail = measure.Explain(worst);
        return new()
        {
            Criterion = measure.Criterion,
            Status = status,
            Binding = Judgement.Binds(criteria, measure.Criterion),
            WorstUse = use[worst],
            Place = ExtremeValues.PlaceOf(samples, worst),
            Joint = detail.Joint,
            Value = double.IsFinite(detail.Value) ? detail.Value : null,
            LimitValue = double.IsFinite(detail.Limit) ? detail.Limit : null,
            Unit = detail.Unit,
            NearThreshold = near,
            Reason = status == CriterionStatus.NotAssessable ? measure.MissingLimit : null,
        };
    }
}
