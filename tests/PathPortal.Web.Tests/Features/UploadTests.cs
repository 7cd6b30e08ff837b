using System.Net;
using System.Net.Http.Headers;
using System.Security.Cryptography;
using System.Text;
using Microsoft.EntityFrameworkCore;
using PathPortal.Formats.Paths;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Programs;
using PathPortal.Web.Tests.Support;

namespace PathPortal.Web.Tests.Features;

public sealed class UploadTests(SiteFixture fixture) : IClassFixture<SiteFixture>
{
    private const string Header = "x_mm,y_mm,z_mm,qw,qx,qy,qz,motion,speed_mm_s,process\n";

    private readonly PortalSite _site = fixture.Site;

    [Fact]
    public async Task Upload_ExampleFile_BecomesARevisionAndComesBackByteForByte()
    {
        var (program, email) = await ProgramAsync();
        using var visitor = await SignedInAsync(email);
        var bytes = Encoding.UTF8.GetBytes(PathExample.Text);
        var answer = await UploadAsync(visitor, program, bytes, "door seam.csv");
        Assert.Equal(HttpStatusCode.Redirect, answer.Status);
        Assert.Equal($"/programs/{program.Id}?revision=1", answer.Location);

        var page = await visitor.GetAsync(answer.Location!);
        var digest = Convert.ToHexStringLower(SHA256.HashData(bytes));
        Assert.Contains(digest, page.Text, StringComparison.Ordinal);
        Assert.Contains("250 mm/s", page.Text, StringComparison.Ordinal);
        var link = page.Document.QuerySelector("a[href^='/files/revision/']")!.GetAttribute("href")!;
        using var file = await visitor.Client.GetAsync(new Uri(link, UriKind.Relative), TestContext.Current.CancellationToken);
        Assert.Equal("attachment", file.Content.Headers.ContentDisposition!.DispositionType);
        Assert.Equal(bytes, await file.Content.ReadAsByteArrayAsync(TestContext.Current.CancellationToken));
    }

    public static TheoryData<string, string, string> BadFiles => new()
    {
        { "nothing in it", "", "" },
        { "a picture", "\u0089PNG\r\n\u001a\n", "" },
        { "prose", "Dear colleague,\nthe path follows by mail.\n", "" },
        { "a column missing", "x_mm,y_mm\n0,0\n1,0\n", "z_mm" },
        { "a column nobody knows", Header.Replace("process", "proces", StringComparison.Ordinal) + Row(0) + Row(1), "proces" },
        { "units mixed", Header.Replace("y_mm", "y_m", StringComparison.Ordinal) + Row(0) + Row(1), "" },
        { "decimal commas", Header + "0,5,0,0,1,0,0,0,straight,100,on\n1,5,0,0,1,0,0,0,straight,100,on\n", "" },
        { "NaN", Header + Row(0) + "NaN,0,0,1,0,0,0,straight,100,on\n", "NaN" },
        { "1e400", Header + Row(0) + "1e400,0,0,1,0,0,0,straight,100,on\n", "1e400" },
        { "one point", Header + Row(0), "" },
        { "a zero quaternion", Header + Row(0) + "1,0,0,0,0,0,0,straight,100,on\n", "" },
    };

    [Theory]
    [MemberData(nameof(BadFiles))]
    public async Task Upload_BadFile_IsRefusedWithPlaceAndLeavesNothing(string what, string content, string named)
    {
        var (program, email) = await ProgramAsync();
        using var visitor = await SignedInAsync(email);
        var answer = await UploadAsync(visitor, program, Encoding.Latin1.GetBytes(content), "path.csv", note: "please keep this note");
        Assert.True(answer.Status == HttpStatusCode.UnprocessableEntity, $"{what}: {answer.Status} {answer.Text}");
        var alert = answer.Document.QuerySelector("main [role=alert]");
        Assert.NotNull(alert);
        Assert.Contains(named, alert.TextContent, StringComparison.Ordinal);
        Assert.Contains("please keep this note", answer.Body, StringComparison.Ordinal);
        Assert.Equal(0, await RevisionsAsync(program));
    }

    [Fact]
    public async Task Upload_LabelThatTurnsTheWritingDirection_IsRefusedOrShownHarmlessly()
    {
        var (program, email) = await ProgramAsync();
        using var visitor = await SignedInAsync(email);
        var text = Header.Replace("\n", ",label\n", StringComparison.Ordinal) + Row(0).Replace("\n", ",start\n", StringComparison.Ordinal) + Row(1).Replace("\n", ",\u202Egnp.exe\n", StringComparison.Ordinal);
        var answer = await UploadAsync(visitor, program, Encoding.UTF8.GetBytes(text), "path.csv");
        Assert.Equal(HttpStatusCode.UnprocessableEntity, answer.Status);
        Assert.DoesNotContain('\u202E', answer.Body);
    }

    [Fact]
    public async Task Upload_200MegaByteFile_IsTooLargeAndSaidSo()
    {
        var (program, email) = await ProgramAsync();
        using var visitor = await SignedInAsync(email);
        using var form = await FormAsync(visitor, program);
        using var stream = new EndlessRows(200L * 1024 * 1024);
        form.Add(new StreamContent(stream), "file", "huge.csv");
        var answer = await visitor.SendAsync(new(HttpMethod.Post, $"/programs/{program.Id}/revisions") { Content = form });
        Assert.Equal(HttpStatusCode.RequestEntityTooLarge, answer.Status);
        Assert.Contains("32 MiB", answer.Text, StringComparison.Ordinal);
        Assert.Equal(0, await RevisionsAsync(program));
    }

    [Fact]
    public async Task Upload_WithoutTheFormsToken_IsRefusedBeforeTheFileIsRead()
    {
        var (program, email) = await ProgramAsync();
        using var visitor = await SignedInAsync(email);
        using var form = new MultipartFormDataContent { { new StringContent("forged"), "__RequestVerificationToken" }, { new StringContent(PathExample.Text), "file", "path.csv" } };
        var answer = await visitor.SendAsync(new(HttpMethod.Post, $"/programs/{program.Id}/revisions") { Content = form });
        Assert.Equal(HttpStatusCode.BadRequest, answer.Status);
        Assert.Equal(0, await RevisionsAsync(program));
    }

    [Fact]
    public async Task Upload_PersonOfAnotherPlant_FindsNoSuchProgram()
    {
        var (program, _) = await ProgramAsync();
        var (own, email) = await ProgramAsync();
        using var visitor = await SignedInAsync(email);
        using var form = await FormAsync(visitor, own);
        form.Add(new StringContent(PathExample.Text), "file", "path.csv");
        var answer = await visitor.SendAsync(new(HttpMethod.Post, $"/programs/{program.Id}/revisions") { Content = form });
        Assert.Equal(HttpStatusCode.NotFound, answer.Status);
        Assert.Equal(HttpStatusCode.NotFound, (await visitor.GetAsync($"/programs/{program.Id}")).Status);
        Assert.Equal(0, await RevisionsAsync(program));
    }

    [Fact]
    public async Task Upload_Viewer_MayNot()
    {
        var (program, author) = await ProgramAsync(Role.Viewer);
        using var visitor = await SignedInAsync(author);
        Assert.Equal(HttpStatusCode.Forbidden, (await visitor.GetAsync($"/programs/{program.Id}/upload")).Status);
        using var form = new MultipartFormDataContent { { new StringContent(await TokenAsync(visitor, "/")), "__RequestVerificationToken" }, { new StringContent(PathExample.Text), "file", "path.csv" } };
        var answer = await visitor.SendAsync(new(HttpMethod.Post, $"/programs/{program.Id}/revisions") { Content = form });
        Assert.Equal(HttpStatusCode.Forbidden, answer.Status);
        Assert.Equal(0, await RevisionsAsync(program));
    }

    private static string Row(int x) => $"{x},0,0,1,0,0,0,straight,100,on\n";

    private async Task<Visitor> SignedInAsync(string email)
    {
        var visitor = _site.Visit();
        await visitor.SignInAsync(email);
        return visitor;
    }

    private async Task<(PathProgram Program, string Email)> ProgramAsync(Role role = Role.Author)
    {
        var id = Guid.NewGuid().ToString("N");
        var plant = await _site.People.PlantAsync("Plant " + id);
        var account = await _site.People.AccountAsync(id + "@plant.example", "Ada " + id, (plant, role));
        var part = new Part("Part " + id, "", DateTimeOffset.UnixEpoch);
        var sheet = new CriteriaSheetRecord("Sheet " + id, DateTimeOffset.UnixEpoch);
        var version = sheet.AddVersion(StoredDocument.Of("{}"), "", account.Id, DateTimeOffset.UnixEpoch);
        var program = new PathProgram(plant.Id, part.Id, "Program " + id, "sealing", sheet.Id, account.Id, DateTimeOffset.UnixEpoch);
        await _site.People.SaveAsync(part, sheet, version, program);
        return (program, id + "@plant.example");
    }

    private static async Task<string> TokenAsync(Visitor visitor, string path) =>
        (await visitor.GetAsync(path)).Document.QuerySelector("input[name=__RequestVerificationToken]")!.GetAttribute("value")!;

    private static async Task<MultipartFormDataContent> FormAsync(Visitor visitor, PathProgram program) =>
        new() { { new StringContent(await TokenAsync(visitor, $"/programs/{program.Id}/upload")), "__RequestVerificationToken" } };

    private static async Task<Visitor.Answer> UploadAsync(Visitor visitor, PathProgram program, byte[] bytes, string name, string note = "")
    {
        using var form = await FormAsync(visitor, program);
        var file = new ByteArrayContent(bytes);
        file.Headers.ContentType = new MediaTypeHeaderValue("text/csv");
        form.Add(new StringContent(note), "note");
        form.Add(file, "file", name);
        return await visitor.SendAsync(new(HttpMethod.Post, $"/programs/{program.Id}/revisions") { Content = form });
    }

    private async Task<int> RevisionsAsync(PathProgram program)
    {
        var count = -1;
        await _site.People.ChangeAsync(async session => count = await session.Db.Revisions.CountAsync(r => r.ProgramId == program.Id));
        return count;
    }

    /// <summary>Rows without end up to a length, made as they are read.</summary>
    private sealed class EndlessRows(long length) : Stream
    {
        private static readonly byte[] Text = Encoding.UTF8.GetBytes(Row(7));
        private long _at;

        public override bool CanRead => true;
        public override bool CanSeek => false;
        public override bool CanWrite => false;
        public override long Length => length;
        public override long Position { get => _at; set => throw new NotSupportedException(); }

        public override int Read(byte[] buffer, int offset, int count)
        {
            var read = (int)Math.Min(count, length - _at);
            for (var i = 0; i < read; i++)
                buffer[offset + i] = Text[(int)((_at + i) % Text.Length)];
            _at += read;
            return read;
        }

        public override void Flush()
        {
        }

        public override long Seek(long offset, SeekOrigin origin) => throw new NotSupportedException();

        public override void SetLength(long value) => throw new NotSupportedException();

        public override void Write(byte[] buffer, int offset, int count) => throw new NotSupportedException();
    }
}
