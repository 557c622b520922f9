using BandSpec.Documents.Model;

namespace BandSpec.Documents.Composing;

/// <summary>Who asked for what: revisions, approval, range, signal and the dwell profile.</summary>
internal static class ApplicationChapter
{
    private const string Celsius = "°C";

    public static IEnumerable<Block> Compose(Composition c, int number)
    {
        yield return c.Chapter(number, "application.heading");
        yield return c.Table(c.Words["application.revisions"], [c.Column("revision"), c.Column("date"), c.Column("change")],
            c.View.Identity.Changes.Select(change => new Row([change.Revision, change.Date, change.Text])));
        yield return c.Table(
            c.Words["application.approval"], [c.Column("role"), c.Column("name"), c.Column("date"), c.Column("signature")], Approvals(c));
        yield return c.Section("application.conditions");
        yield return new Facts(
        [
            c.Fact("pressure"), c.Fact("proof"), c.Fact("output"), c.Fact("resolution"), c.Fact("temperature"), c.Fact("reference"),
            c.Fact("safety"), c.Fact("service"), c.Fact("ageing"), c.Fact("rms"), c.Fact("outside"),
        ]);
        var profile = c.View.Profile;
        yield return c.Table(c.Words["application.profile"],
            [
                c.Column("from", Align.Decimal, Celsius), c.Column("to", Align.Decimal, Celsius),
                c.Column("dwell", Align.Decimal, "h"), c.Column("share", Align.Decimal, "%"),
            ],
            profile.Bins.Select(b => new Row([b.From, b.To, b.Dwell, b.Share])), c.Words["application.profile-remark"]);
        yield return c.Figure("application.profile-figure", c.Charts.Profile, "dwell-profile.svg", ("bins", profile.Bins.Count));
    }

    // The empty line under each name is room for a hand to sign.
    private static IEnumerable<Row> Approvals(Composition c) =>
    [
        new([c.Words["role.prepared"] + "\n", c.View.Identity.PreparedBy, c.View.Identity.Date, ""]),
        new([c.Words["role.checked"] + "\n", "", "", ""]),
        new([c.Words["role.approved"] + "\n", "", "", ""]),
    ];
}
