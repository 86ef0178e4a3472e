//! The shop card of a joint: what is heated or chilled, to what, on which day.

use crate::evaluate::Evaluation;
use crate::model::Assembly;

/// What a shop needs to join two parts without force. Temperatures in K; they hold for every pair
/// within the tolerances.
#[derive(Debug, Clone)]
pub struct ShopCard {
    /// The name of the joint.
    pub joint: String,
    /// The part outside.
    pub outer: String,
    /// The part inside.
    pub inner: String,
    /// The condition that is the day of assembly; the reference temperature if absent.
    pub day: Option<String>,
    /// Its temperature.
    pub ambient: f64,
    /// Clearance while joining, m.
    pub clearance: f64,
    /// Heat the outer part to this; `None` where its data end first.
    pub heat: Option<f64>,
    /// The highest temperature that the outer part's material allows.
    pub limit: Option<f64>,
    /// Where the outer part's data end.
    pub outer_data: f64,
    /// Or chill the inner part to this; `None` where its data end first.
    pub chill: Option<f64>,
    /// Where the inner part's data end.
    pub inner_data: f64,
    /// True where heating alone joins and stays within what the material allows.
    pub may_be_heated: bool,
    /// Where it does not: heat the outer part to the first and chill the inner one to the second;
    /// that is `None` where its data end first.
    pub together: Option<(f64, Option<f64>)>,
}

/// The cards of all joints.
pub(super) fn cards(assembly: &Assembly, evaluation: &Evaluation) -> Vec<ShopCard> {
    let card = |card: &crate::evaluate::outcome::ShopCard| {
        let joint = assembly.fit(card.subject)?.joint.as_ref()?;
        Some(ShopCard {
            joint: assembly.subject(card.subject).name.clone(),
            outer: assembly.part(joint.outer.part).name.clone(),
            inner: assembly.part(joint.inner.part).name.clone(),
            day: card.day.map(|c| assembly.condition(c).name.clone()),
            ambient: card.ambient,
            clearance: card.insertion_clearance,
            heat: card.heat_outer,
            limit: card.outer_limit,
            outer_data: card.outer_data,
            chill: card.chill_inner,
            inner_data: card.inner_data,
            may_be_heated: card.may_be_heated(),
            together: card.together.map(|t| (t.heat_outer, t.chill_inner)),
        })
    };
    evaluation.shop_cards.iter().filter_map(card).collect()
}
