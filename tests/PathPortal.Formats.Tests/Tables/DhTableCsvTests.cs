using PathPortal.Engine.Arms;
using PathPortal.Formats.Documents;
using PathPortal.Formats.Tables;
using PathPortal.Formats.Tests.Documents;

namespace PathPortal.Formats.Tests.Tables;

public sealed class DhTableCsvTests
{
    [Fact]
    public void Read_OfStandardColumns_IsTheSameArmAsTheDocument()
    {
        var read = DhTableCsv.Read(
            "theta_deg,d_mm,a_mm,alpha_deg,low_deg,high_deg,speed_deg_s,source\n,400,50,90,-170,170,220.5,invented\n,,420,,-170,170,220.5,invented\n,,30,90,-170,170,220.5,invented\n"
            + ",380,,-90,-170,170,220.5,invented\n,,,90,-170,170,220.5,invented\n,90,,,-170,170,220.5,invented\n",
            "Invented six-joint arm");

        Assert.Empty(read.Problems);
        Assert.Equal((InventedDocuments.Arm() with { Note = "" }).ToJson(), read.Value!.ToJson());
    }

    [Fact]
    public void Read_OfModifiedColumns_HasTheTextbookPose()
    {
        var arm = DhTableCsv.Read(
            "name,theta_deg,d_mm,a_before_mm,alpha_before_deg\na,0,0,0,0\nb,0,0,0,-90\nc,0,120,450,0\nd,0,420,20,-90\ne,0,0,0,90\nf,0,0,0,-90\n", "modified").Value!;

        var X = ArmPose.Compute(
            arm.ToArmModel(), [0.4363323129985824, -0.6108652381980153, 0.6981317007977318, 0.9599310885968813, -1.1344640137963142, 1.3962634015954636]).Flange;

        // J. Craig, Introduction to Robotics, ch. 3, the worked six-joint arm with other lengths; numpy and Orocos KDL.
        Assert.Equal(ArmKinematics.DhModified, arm.Kinematics);
        Assert.Equal(0.2682489633629568, X.Translation.X, 1e-12);
        Assert.Equal(0.25749189618378543, X.Translation.Y, 1e-12);
        Assert.Equal(-0.16203549169551545, X.Translation.Z, 1e-12);
        Assert.Equal(-0.4137806502388828, X.Rotation.R11, 1e-12);
    }

    [Theory]
    [InlineData("theta_deg,d_mm,a_mm\n0,0,0\n", 1, 1, "A column is missing.")]
    [InlineData("theta_deg,d_mm,a_mm,alpha_deg,a_before_mm\n0,0,0,0,0\n", 1, 1, "The table mixes both conventions.")]
    [InlineData("theta_deg,d_mm,a_mm,alfa_deg\n0,0,0,0\n", 1, 21, "The column is not known.")]
    [InlineData("theta_deg,d_mm,a_mm,alpha_deg\n0,\"1,5\",0,0\n", 2, 3, "The number has a comma; only a decimal point is read, and no thousands marks.")]
    [InlineData("theta_deg,d_mm,a_mm,alpha_deg\n0,0,0\n", 2, 5, "The row has 3 cells.")]
    [InlineData("theta_deg,d_mm,a_mm,alpha_deg,kind\n0,0,0,0,linear\n", 2, 9, "This word is not known here.")]
    [InlineData("theta_deg,d_mm,a_mm,alpha_deg,kind,low_deg\n0,0,0,0,prismatic,5\n", 2, 19, "The unit does not fit the kind of the joint.")]
    [InlineData("theta_deg,d_mm,a_mm,alpha_deg,low_deg,high_deg\n0,0,0,0,0,1\n0,0,0,0,1,-1\n", 3, 0, "The high limit is not above the low one.")]
    [InlineData("theta_deg,d_mm,a_mm,alpha_deg,sign\n0,0,0,0,2\n", 2, 0, "The number is outside its range.")]
    [InlineData("theta_deg,d_mm,a_mm,alpha_deg\n", 0, 0, "The list has the wrong length.")]
    [InlineData("theta_deg,d_mm,a_mm,alpha_deg\n0,0,0,0\n0,0,0,0\n0,0,0,0\n0,0,0,0\n0,0,0,0\n0,0,0,0\n0,0,0,0\n0,0,0,0\n0,0,0,0\n", 0, 0, "The list has the wrong length.")]
    public void Read_OfOneFault_NamesPlaceAndFault(string file, int line, int column, string message)
    {
        var problem = DhTableCsv.Read(file, "arm").Problems[0];

        Assert.Equal((line, column, message), (problem.Line, problem.Column, problem.Message));
    }
}
