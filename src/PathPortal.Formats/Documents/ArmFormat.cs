using PathPortal.Engine.Arms;
using PathPortal.Formats.Json;

namespace PathPortal.Formats.Documents;

/// <summary>How an arm document looks.</summary>
internal static class ArmFormat
{
    public static DocumentFormat<ArmDocument> Format { get; } = new(ArmDocument.FormatName, new Shape<ArmDocument>()
        .With(new TextField<ArmDocument>("name", TextRule.Name, a => a.Name, (a, v) => a.Name = v))
        .With(new TextField<ArmDocument>("note", TextRule.Note, a => a.Note, (a, v) => a.Note = v))
        .With(new NumberField<ArmDocument>(
            "characteristic_length_mm", true, NumberRule.AboveZero("mm", PoseShapes.FarthestMm),
            a => a.CharacteristicLengthMm, (a, v) => a.CharacteristicLengthMm = v ?? 0))
        .With(new ChoiceField<ArmDocument, ArmKinematics>("kinematics", Words.All<ArmKinematics>(), a => a.Kinematics, (a, v) => a.Kinematics = v))
        .With(new ListField<ArmDocument, JointDocument>(
            "joints", 1, ArmModel.MaxJoints, "joints", a => JointShapes.For(a.Kinematics), a => a.Joints, j => j.Name))
        .With(new ObjectField<ArmDocument, PoseDocument>("flange_in_last_frame", true, _ => PoseShapes.Pose, a => a.Flange, (a, v) => a.Flange = v))
        .Rule((a, path, problems) =>
        {
            // What the engine cannot run on must not be saved either.
            foreach (var problem in ArmCheck.Find(ArmConversion.ToArmModel(a)))
            {
                problems.Add(
                    0, 0, "joints", "", problem.Expected, $"No simulation can run on this arm: {problem.Place}, {problem.Quantity}.");
            }
        }));
}
