//! What the rules of the grammar are to people.

use crate::syntax::grammar::Rule;

/// What a rule is to people.
pub(super) enum Meaning {
    /// A thing with a description.
    Thing(&'static str),
    /// Words of the language.
    Words(&'static [&'static str]),
    /// Nothing that helps.
    Silent,
}

/// The text of a word's rule.
fn word(rule: Rule) -> Option<&'static [&'static str]> {
    Some(match rule {
        Rule::word_rev => &["rev"],
        Rule::word_in => &["in"],
        Rule::word_iso => &["ISO"],
        Rule::word_angle => &["angle"],
        Rule::word_from => &["from"],
        Rule::word_above => &["above"],
        Rule::word_below => &["below"],
        Rule::word_of => &["of"],
        Rule::word_like => &["like"],
        Rule::word_instantaneous => &["instantaneous"],
        Rule::word_mean => &["mean"],
        Rule::word_over => &["over"],
        Rule::word_lot => &["lot"],
        Rule::word_internal => &["internal"],
        Rule::word_external => &["external"],
        Rule::word_radius => &["radius"],
        Rule::word_dia => &["dia"],
        Rule::word_exact => &["exact"],
        Rule::word_one => &["one"],
        Rule::word_at => &["at"],
        Rule::word_along => &["along"],
        Rule::word_across => &["across"],
        Rule::word_before => &["before"],
        Rule::word_after => &["after"],
        Rule::word_coating => &["coating"],
        Rule::word_build_up => &["build-up"],
        Rule::word_on => &["on"],
        Rule::word_both => &["both"],
        Rule::word_side => &["side"],
        Rule::word_sides => &["sides"],
        Rule::word_load => &["load"],
        Rule::word_strain => &["strain"],
        Rule::word_basis => &["basis"],
        Rule::word_measured => &["measured"],
        Rule::word_supplier => &["supplier"],
        Rule::word_assumed => &["assumed"],
        Rule::word_drawing => &["drawing"],
        Rule::word_because => &["because"],
        Rule::word_spread => &["spread"],
        Rule::word_normal => &["normal"],
        Rule::word_sorted => &["sorted"],
        Rule::word_uniform => &["uniform"],
        Rule::word_triangular => &["triangular"],
        Rule::word_cpk => &["Cpk"],
        Rule::word_shift => &["shift"],
        Rule::word_clearance => &["clearance"],
        Rule::word_inner => &["inner"],
        Rule::word_outer => &["outer"],
        Rule::word_bore => &["bore"],
        Rule::word_outside => &["outside"],
        Rule::word_solid => &["solid"],
        Rule::word_rz => &["Rz"],
        Rule::word_area => &["area"],
        Rule::word_stiffness => &["stiffness"],
        Rule::word_gap => &["gap"],
        Rule::word_yield => &["yield"],
        Rule::word_except => &["except"],
        Rule::word_by => &["by"],
        Rule::word_worst => &["worst"],
        Rule::word_case => &["case"],
        Rule::word_rss => &["rss"],
        Rule::word_sigma => &["sigma"],
        Rule::word_for => &["for"],
        Rule::word_assemblies => &["assemblies"],
        Rule::word_concession => &["concession"],
        Rule::word_accepts => &["accepts"],
        Rule::word_until => &["until"],
        Rule::word_approved => &["approved"],
        _ => return None,
    })
}

/// What a rule is to people; no message holds the name of a rule.
pub(super) fn meaning(rule: Rule) -> Meaning {
    use Meaning::{Silent, Thing, Words};
    if let Some(word) = word(rule) {
        return Words(word);
    }
    match rule {
        Rule::name | Rule::state => Thing("a name"),
        Rule::string => Thing("words in quotes"),
        Rule::number
        | Rule::signed
        | Rule::scalar
        | Rule::plain
        | Rule::nominal
        | Rule::quantity
        | Rule::group => Thing("a number"),
        Rule::deviation | Rule::signed_number | Rule::zero => Thing("a signed deviation"),
        Rule::unit | Rule::factor_unit => Thing("a unit"),
        Rule::table_unit => Thing("a unit after a comma"),
        Rule::tolerance | Rule::symmetric => Thing("a tolerance"),
        Rule::range_end => Thing("`..`"),
        Rule::slash => Thing("`/`"),
        Rule::equals => Thing("`=`"),
        Rule::closing => Thing("`)`"),
        Rule::standard => Thing("`2768-`"),
        Rule::size => Thing("a size"),
        Rule::class => Thing("a class such as `H7`"),
        Rule::characteristic | Rule::geometrical => Thing("a geometrical tolerance"),
        Rule::expr | Rule::product | Rule::factor | Rule::atom => {
            Thing("a dimension, a number or `(`")
        }
        Rule::path | Rule::term | Rule::pieces => Thing("a dimension"),
        Rule::add | Rule::subtract | Rule::multiply | Rule::divide | Rule::exponent => {
            Thing("an operator")
        }
        Rule::operand => Thing("a size or a dimension"),
        Rule::limit => Thing("a limit such as `>= 0.1`"),
        Rule::comparison => Thing("`>=` or `<=`"),
        Rule::measure | Rule::measure_word => Thing("a quantity such as `clearance`"),
        Rule::date => Thing("a date such as `2027-03-31`"),
        Rule::decimals => Thing("`.XX`"),
        Rule::general_class => Thing("a class such as `m`"),
        Rule::own_temperature => Thing("a temperature"),
        Rule::property => Thing("a property"),
        Rule::decimal_line => Thing("`.XX` or `angle`"),
        Rule::row_line => Thing("a temperature or a moisture"),
        Rule::override_line | Rule::surface_line => Thing("the name of a part"),
        Rule::direction => Words(&["along", "across"]),
        Rule::coating => Words(&["before", "after"]),
        Rule::distribution => Words(&["normal", "sorted", "uniform", "triangular", "from"]),
        Rule::normal => Words(&["normal"]),
        Rule::material_condition => Words(&["MMC", "LMC"]),
        _ => Silent,
    }
}
