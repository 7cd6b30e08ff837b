using System.Text;
using System.Xml;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Urdf;

/// <summary>
/// Reads the XML of a URDF file in one forward pass: no document type, no entities, no recursion, a bounded depth. Elements that kinematics does
/// not need are passed over.
/// </summary>
internal sealed class UrdfXml(ProblemList problems)
{
    // URDF itself needs five levels; extensions inside it some more. Checked before anything is kept per level.
    private const int MaxDepth = 64;
    private const int MaxParts = 20_000;

    private static readonly XmlReaderSettings Settings = new()
    {
        DtdProcessing = DtdProcessing.Prohibit,
        XmlResolver = null,
        MaxCharactersInDocument = ReadLimits.UrdfBytes,
        IgnoreComments = true,
        IgnoreProcessingInstructions = true,
        IgnoreWhitespace = true,
    };

    private UrdfJoint? _joint;
    private readonly HashSet<string> _seen = new(StringComparer.Ordinal);

    public string RobotName { get; private set; } = "";

    public List<(string Name, int Line, int Column)> Links { get; } = [];

    public List<UrdfJoint> Joints { get; } = [];

    public void Read(byte[] utf8)
    {
        var text = Encoding.UTF8.GetString(utf8);
        using var reader = XmlReader.Create(new StringReader(text), Settings);
        var lines = (IXmlLineInfo)reader;
        try
        {
            while (!problems.Stopped && reader.Read())
            {
                if (reader.NodeType == XmlNodeType.Element)
                {
                    ReadElement(reader, lines);
                }
            }
        }
        catch (XmlException error)
        {
            var macro = text.Contains("xacro:", StringComparison.Ordinal) && !text.Contains("xmlns:xacro", StringComparison.Ordinal);
            var type = text.Contains("<!DOCTYPE", StringComparison.Ordinal);
            problems.Add(
                error.LineNumber, error.LinePosition, "", "",
                macro ? "the file a macro processor makes of this one" : "well-formed XML without a document type",
                macro ? "The file holds macros that were not expanded." : type ? "The file has a document type definition; such files are not read." : "The text is not well-formed XML here.");
        }
    }

    private void ReadElement(XmlReader reader, IXmlLineInfo lines)
    {
        if (reader.Depth >= MaxDepth)
        {
            Stop(lines, reader.Name, $"at most {MaxDepth} levels", "The elements are nested too deep.");
        }
        else if (reader.Prefix == "xacro" || reader.NamespaceURI.Contains("xacro", StringComparison.Ordinal))
        {
            Stop(lines, reader.Name, "the file a macro processor makes of this one", "The file holds macros that were not expanded.");
        }
        else if (reader.Depth == 0)
        {
            ReadRobot(reader, lines);
        }
        else if (reader.Depth == 1)
        {
            _joint = null;
            if (reader.Name == "link")
            {
                Links.Add((Name(reader, lines, "link"), lines.LineNumber, lines.LinePosition));
            }
            else if (reader.Name == "joint")
            {
                ReadJoint(reader, lines);
            }

            if (Links.Count + Joints.Count > MaxParts)
            {
                Stop(lines, "", $"at most {MaxParts} links and joints", "The file has too many links and joints.");
            }
        }
        else if (reader.Depth == 2 && _joint is not null)
        {
            new UrdfJointPart(reader, lines, _joint, _seen, problems).Read();
        }
    }

    private void ReadRobot(XmlReader reader, IXmlLineInfo lines)
    {
        if (reader.LocalName != "robot")
        {
            Stop(lines, reader.Name, "the element robot", "The file is not a URDF robot description.");
            return;
        }

        RobotName = reader.GetAttribute("name") ?? "";
        if (reader.GetAttribute("version") is { } version && version is not ("1" or "1.0"))
        {
            Stop(lines, version, "version 1.0, or none", "This version of URDF is not read.");
        }
    }

    private void ReadJoint(XmlReader reader, IXmlLineInfo lines)
    {
        var (line, column) = (lines.LineNumber, lines.LinePosition);
        var name = Name(reader, lines, "joint");
        var type = reader.GetAttribute("type") ?? "";
        var known = type switch
        {
            "fixed" => UrdfJointType.Fixed,
            "revolute" => UrdfJointType.Revolute,
            "continuous" => UrdfJointType.Continuous,
            "prismatic" => UrdfJointType.Prismatic,
            "floating" => UrdfJointType.Floating,
            "planar" => UrdfJointType.Planar,
            _ => (UrdfJointType?)null,
        };
        if (known is null)
        {
            problems.Add(
                line, column, $"joint {name}, type", type, "fixed, revolute, continuous, prismatic, floating or planar",
                "The joint has no known type.");
        }

        _joint = new() { Name = name, Type = known ?? UrdfJointType.Fixed, Line = line, Column = column };
        _seen.Clear();
        Joints.Add(_joint);
    }

    private string Name(XmlReader reader, IXmlLineInfo lines, string what)
    {
        var name = reader.GetAttribute("name") ?? "";
        if (name.Length == 0)
        {
            problems.Add(lines.LineNumber, lines.LinePosition, what, "", "an attribute name", $"A {what} has no name.");
        }

        return name;
    }

    private void Stop(IXmlLineInfo lines, string value, string expected, string message)
    {
        problems.Add(lines.LineNumber, lines.LinePosition, "", value, expected, message);
        problems.Stop();
    }
}
