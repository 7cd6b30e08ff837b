using System.Collections.Immutable;
using System.Globalization;
using PathPortal.Engine.Arms;

namespace PathPortal.Engine.Postures;

/// <summary>Adds to a branch's name which joints are a whole turn away from their value in (−180°, 180°].</summary>
internal static class TurnWords
{
    public static string Add(string description, ArmModel arm, ImmutableArray<double> joints)
    {
        for (var i = 0; i < joints.Length; i++)
        {
            if (arm.Joints[i].Kind != JointKind.Revolute)
            {
                continue;
            }

            var turns = (int)Math.Round((joints[i] - JointTurns.Wrap(joints[i])) / JointTurns.Full);
            if (turns != 0)
            {
                description += string.Create(
                    CultureInfo.InvariantCulture, $", joint {i + 1} {turns:+0;−0} {(Math.Abs(turns) == 1 ? "turn" : "turns")}");
            }
        }

        return description;
    }
}
