//! `concession`: an accepted departure, for a while.
//!
//! A concession that is wrong is dropped, so that its requirement stands without it.

use crate::diagnostic::{Code, Diagnostic};
use crate::model::Concession;
use crate::resolve::expression::Resolver;
use crate::resolve::quantity::{self, Expect, Limits};
use crate::syntax::tree;
use crate::units::Kind;

impl Resolver<'_, '_, '_> {
    /// A concession whose date is one and whose value lies outside the limits.
    pub(super) fn concession(
        &mut self,
        stated: &tree::Concession,
        of: &tree::Requirement,
        kind: Kind,
        limits: &Limits,
    ) -> Option<Concession> {
        let dated = is_date(&stated.until.value);
        if !dated {
            self.cx.report(
                Diagnostic::new(
                    Code::ConcessionDate,
                    stated.until.span,
                    format!(
                        "`{}` is no date, so the concession does not count",
                        stated.until.value
                    ),
                )
                .help("write year, month and day, as `2027-03-31`"),
            );
        }
        let expect = match of.limit.of_yield {
            Some(_) => Expect::Of(Kind::PURE),
            None => Expect::limit(kind),
        };
        let accepts = quantity::scalar(self.cx, &stated.accepts, expect)?;
        let below = limits.lower.as_ref().is_some_and(|lower| accepts < lower.value);
        let above = limits.upper.as_ref().is_some_and(|upper| accepts > upper.value);
        if !below && !above {
            let text = self.cx.text(stated.accepts.span()).to_string();
            return self.cx.refuse(
                Diagnostic::new(
                    Code::ConcessionInside,
                    stated.accepts.span(),
                    format!("{text} lies inside the limit, so there is nothing to accept"),
                )
                .label(of.limit.span, "the limit")
                .help("state the value that is accepted beyond the limit"),
            );
        }
        dated.then(|| Concession {
            id: stated.id.value.clone(),
            accepts,
            written: self.cx.text(stated.accepts.span()).to_string(),
            until: stated.until.value.clone(),
            approved: Some(stated.approved.value.clone()),
            because: stated.because.as_ref().map(|text| text.value.clone()),
            span: stated.span,
        })
    }
}

/// True for a day of the Gregorian calendar as ISO 8601 writes it, `2027-03-31`.
fn is_date(text: &str) -> bool {
    let fields: Vec<&str> = text.split('-').collect();
    let [year, month, day] = fields.as_slice() else { return false };
    let digits = |field: &str, count: usize| {
        (field.len() == count && field.bytes().all(|b| b.is_ascii_digit()))
            .then(|| field.parse::<u32>().ok())
            .flatten()
    };
    let (Some(year), Some(month), Some(day)) = (digits(year, 4), digits(month, 2), digits(day, 2))
    else {
        return false;
    };
    let leap = year.is_multiple_of(4) && (!year.is_multiple_of(100) || year.is_multiple_of(400));
    let days = match month {
        1 | 3 | 5 | 7 | 8 | 10 | 12 => 31,
        4 | 6 | 9 | 11 => 30,
        2 if leap => 29,
        2 => 28,
        _ => return false,
    };
    (1..=days).contains(&day)
}

#[cfg(test)]
mod tests {
    use super::is_date;

    #[test]
    fn dates_are_days_of_the_calendar() {
        for good in ["2027-03-31", "2028-02-29", "2000-02-29"] {
            assert!(is_date(good), "{good}");
        }
        for bad in
            ["2027-02-29", "2100-02-29", "2027-13-01", "2027-3-31", "31.03.2027", "2027-04-31"]
        {
            assert!(!is_date(bad), "{bad}");
        }
    }
}
