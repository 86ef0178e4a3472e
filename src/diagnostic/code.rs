//! The closed list of finding codes. Each names a problem, not a cure, and has its page section in
//! `docs/findings.md` and a spec that provokes it (`tests/tidy.rs` holds both).

use super::Severity;

macro_rules! codes {
    ($($(#[$doc:meta])* $name:ident = $text:literal, $severity:ident;)*) => {
        /// A stable name for one kind of finding.
        #[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
        pub enum Code { $($(#[$doc])* $name,)* }

        impl Code {
            /// Every code, in the order of this list.
            pub const ALL: &'static [Code] = &[$(Code::$name,)*];

            /// The code as written in reports.
            pub fn text(self) -> &'static str {
                match self { $(Code::$name => $text,)* }
            }

            /// The severity a finding of this code has unless it says otherwise.
            pub fn severity(self) -> Severity {
                match self { $(Code::$name => Severity::$severity,)* }
            }
        }
    };
}

codes! {
    /// A statement the grammar does not know.
    SyntaxError = "syntax-error", Error;
    /// A brace opened and never closed.
    UnclosedBrace = "unclosed-brace", Error;
    /// A brace closed and never opened.
    StrayBrace = "stray-brace", Error;
    /// A string without its closing quote.
    UnclosedString = "unclosed-string", Error;
    /// A clause or line that may stand once and stands twice.
    StatedTwice = "stated-twice", Error;
    /// A name that has a meaning of its own.
    ReservedName = "reserved-name", Error;
    /// A temperature written with a plus, which may be a difference.
    SignedTemperature = "signed-temperature", Error;
    /// A comma where a decimal point is meant.
    DecimalComma = "decimal-comma", Error;
    /// Blocks nested deeper than the language allows.
    NestedTooDeep = "nested-too-deep", Error;
    /// A file that is not UTF-8 or holds NUL bytes.
    NotText = "not-text", Error;

    /// A name of a condition that nothing defines.
    UnknownCondition = "unknown-condition", Error;
    /// A name of a part that nothing defines.
    UnknownPart = "unknown-part", Error;
    /// A unit that the language does not know.
    UnknownUnit = "unknown-unit", Error;
    /// A unit that means different things to different people, such as `mil`.
    AmbiguousUnit = "ambiguous-unit", Error;
    /// A number without the unit it needs.
    UnitMissing = "unit-missing", Error;
    /// A unit whose reach can be read in two ways, as in `58 ±50 um`.
    UnitScope = "unit-scope", Error;
    /// A quantity of another kind than its place asks for.
    WrongKind = "wrong-kind", Error;
    /// A range whose first end is the greater.
    LimitsReversed = "limits-reversed", Error;
    /// Two limit deviations that leave nothing between them.
    DeviationsEqual = "deviations-equal", Error;
    /// A spread of a value that has no limits.
    SpreadOfNothing = "spread-of-nothing", Error;
    /// A number that no such quantity can have.
    ValueOutOfRange = "value-out-of-range", Error;
    /// A temperature below absolute zero.
    BelowAbsoluteZero = "below-absolute-zero", Error;
    /// A path to a file that is not there.
    FileMissing = "file-missing", Error;
    /// A path out of the root of the run.
    FileOutside = "file-outside", Error;
    /// A file that is there and cannot be read.
    FileUnreadable = "file-unreadable", Error;
    /// A table whose rows and columns are not what its use asks for.
    TableShape = "table-shape", Error;
    /// A cell of a table that holds no number.
    TableCell = "table-cell", Error;
    /// A tolerance of a temperature that sizes are stated at.
    ToleranceOfReference = "tolerance-of-reference", Error;
    /// A class of general tolerances that ISO 2768-1 does not have.
    UnknownGeneralClass = "unknown-general-class", Error;
    /// A size without a tolerance, its own or a general one.
    ToleranceMissing = "tolerance-missing", Error;
    /// A tolerance class spelled as ISO 286 spells none.
    ClassMisspelled = "class-misspelled", Error;
    /// A tolerance class that ISO 286 does not define at that size.
    ClassUndefined = "class-undefined", Error;
    /// A tolerance class that is still to be chosen.
    ClassLeftOpen = "class-left-open", Error;
    /// A tolerance class of the other side than the one stated.
    ClassAgainstSide = "class-against-side", Error;
    /// A tolerance class where there is no feature of size.
    ClassOfNoSize = "class-of-no-size", Error;
    /// A set to select from that has one size.
    SetOfOne = "set-of-one", Error;
    /// A form that a geometrical tolerance or its zone cannot have.
    FormOfTolerance = "form-of-tolerance", Error;
    /// A bonus of something that is no feature of size of the same part.
    BonusOfNoSize = "bonus-of-no-size", Error;
    /// A bonus at least material condition.
    BonusAtLeastMaterial = "bonus-at-least-material", Error;
    /// A bonus of a feature that may be a hole or a shaft.
    BonusSideUnknown = "bonus-side-unknown", Error;
    /// A coating that may add to a size or take from it.
    CoatingSideUnknown = "coating-side-unknown", Error;
    /// Coated faces that are not stated, or stated of a round feature.
    CoatingSides = "coating-sides", Error;
    /// A direction that a dimension or a material leaves open.
    DirectionMissing = "direction-missing", Error;
    /// A direction where there is none.
    DirectionUnneeded = "direction-unneeded", Error;
    /// A name of a dimension that nothing defines.
    UnknownDimension = "unknown-dimension", Error;
    /// A name of a material that neither the files nor the library define.
    UnknownMaterial = "unknown-material", Error;
    /// A moisture that a part's material does not have.
    UnknownMoisture = "unknown-moisture", Error;
    /// A column of a history that names nothing in the spec.
    UnknownColumn = "unknown-column", Error;
    /// Parts that a history says nothing of.
    HistoryIncomplete = "history-incomplete", Error;
    /// Times of a history that do not rise.
    TimeNotRising = "time-not-rising", Error;
    /// Kelvins that may be a temperature or a difference.
    TemperatureOrDifference = "temperature-or-difference", Error;
    /// Temperatures that are measured from each other in a circle.
    TemperatureCycle = "temperature-cycle", Error;
    /// A part's own temperature that does not follow a range or a history.
    TemperaturePinned = "temperature-pinned", Note;
    /// A name defined twice.
    DuplicateName = "duplicate-name", Error;
    /// Parts or materials that are like each other in a circle.
    LikeCycle = "like-cycle", Error;
    /// A lot of material shared by parts of two materials.
    LotOfTwoMaterials = "lot-of-two-materials", Error;
    /// A material that does not say how it expands.
    ExpansionMissing = "expansion-missing", Error;
    /// A coefficient of expansion that looks like one per degree of the other scale.
    ExpansionOfOtherDegree = "expansion-of-other-degree", Warning;
    /// A table of coefficients that may be mean or instantaneous ones.
    TableFormMissing = "table-form-missing", Error;
    /// Temperatures of a table that do not rise.
    TableNotRising = "table-not-rising", Error;
    /// A tolerance of a single row of a table, or one that differs both ways.
    ToleranceOfRow = "tolerance-of-row", Error;
    /// A spread of a material's scatter.
    SpreadOfMaterial = "spread-of-material", Error;
    /// A first state of moisture that has swollen.
    SwellOfFirstState = "swell-of-first-state", Error;

    /// A file without the line that makes it an assembly.
    AssemblyMissing = "assembly-missing", Error;
    /// A file with an `assembly` line, used by another.
    UsedAssembly = "used-assembly", Error;
    /// Files that use each other in a circle.
    UseCycle = "use-cycle", Error;
    /// A file of materials that cannot be read.
    MaterialFile = "material-file", Error;
    /// An assembly without a condition.
    NoCondition = "no-condition", Error;
    /// A name in an expression that nothing defines.
    UnknownName = "unknown-name", Error;
    /// A function that the language does not know.
    UnknownFunction = "unknown-function", Error;
    /// A quantity that its subject does not have.
    UnknownQuantity = "unknown-quantity", Error;
    /// A requirement that does not say which quantity it limits.
    QuantityMissing = "quantity-missing", Error;
    /// A name of one kind of statement where another is meant.
    WrongSubject = "wrong-subject", Error;
    /// Something else where a dimension is needed.
    NotADimension = "not-a-dimension", Error;
    /// A function with too few or too many arguments.
    ArgumentCount = "argument-count", Error;
    /// A sum of two kinds of quantity.
    KindsDiffer = "kinds-differ", Error;
    /// An exponent that is not a constant pure number.
    ExponentNotConstant = "exponent-not-constant", Error;
    /// A point on the temperature scale in an expression.
    AbsoluteTemperature = "absolute-temperature", Error;
    /// A dimension beside the pieces of it that are counted.
    PieceCountedTwice = "piece-counted-twice", Error;
    /// A definition that leads back to itself.
    DefinitionLoop = "definition-loop", Error;
    /// An expression that is too long with everything it names put in.
    ExpressionTooLong = "expression-too-long", Error;
    /// A fit whose sides are exchanged.
    FitReversed = "fit-reversed", Error;
    /// A hole on the external side of a fit, or a shaft on the internal one.
    FeatureOnWrongSide = "feature-on-wrong-side", Error;
    /// A radius as a side of a fit.
    RadiusInFit = "radius-in-fit", Error;
    /// Something that needs a joint, of a fit without one.
    NoJoint = "no-joint", Error;
    /// A joint of features that are not round.
    JointNotRound = "joint-not-round", Error;
    /// A joint that does not state what it needs.
    JointIncomplete = "joint-incomplete", Error;
    /// A part or size that does not belong to the joint or restraint.
    NotOfThatJoint = "not-of-that-joint", Error;
    /// A surface that the ring does not have besides its contact.
    WrongSurface = "wrong-surface", Error;
    /// A ring or wall whose outside is not larger than its bore.
    RingWithoutWall = "ring-without-wall", Error;
    /// A tolerance of a size that belongs to no part.
    ToleranceNotOfAPart = "tolerance-not-of-a-part", Error;
    /// A restraint that does not state what it needs.
    RestraintIncomplete = "restraint-incomplete", Error;
    /// A fill that does not state what it needs.
    FillIncomplete = "fill-incomplete", Error;
    /// A range or history where one temperature is needed.
    NotOneTemperature = "not-one-temperature", Error;
    /// A condition for a quantity that has none.
    NotAtACondition = "not-at-a-condition", Error;
    /// A requirement that is left without a condition.
    NothingToCheck = "nothing-to-check", Error;
    /// An id that two requirements have.
    DuplicateId = "duplicate-id", Error;
    /// Two requirements that nothing tells apart.
    RequirementsAlike = "requirements-alike", Error;
    /// A concession until a day that is none.
    ConcessionDate = "concession-date", Error;
    /// A concession for a value that the limit allows.
    ConcessionInside = "concession-inside", Error;
    /// A dimension that nothing uses.
    UnusedDimension = "unused-dimension", Warning;
    /// A sum of diameters and radii.
    DiameterAndRadius = "diameter-and-radius", Warning;
    /// One drawing named at two revisions.
    DrawingRevisions = "drawing-revisions", Warning;
    /// A requirement of an expression that no dimension enters.
    NothingVaries = "nothing-varies", Warning;
    /// The free size of a ring that is pressed.
    FreeSizeOfRing = "free-size-of-ring", Warning;
    /// PTFE stated at a temperature where its length jumps.
    PtfeTransition = "ptfe-transition", Warning;
    /// One temperature for all parts in a condition in which something heats them.
    OneTemperature = "one-temperature", Note;
    /// A coating on one of two mating surfaces.
    OneCoatedMate = "one-coated-mate", Note;
    /// A root sum of squares of few contributors.
    RssOfFew = "rss-of-few", Note;
    /// A contributor that makes over half of a variance.
    VarianceOfOne = "variance-of-one", Note;
    /// Statistics of sizes that nobody has said how they vary.
    SpreadAssumed = "spread-assumed", Note;
    /// A share of assemblies that is finer than the measured values behind it show.
    TailBeyondMeasured = "tail-beyond-measured", Warning;
    /// One piece counted several times where several pieces may be meant.
    CopiesOrPieces = "copies-or-pieces", Note;
    /// A fit with less clearance than required.
    ClearanceBelowLimit = "clearance-below-limit", Error;
    /// A fit with more clearance than required.
    ClearanceAboveLimit = "clearance-above-limit", Error;
    /// A fit with less interference than required.
    InterferenceBelowLimit = "interference-below-limit", Error;
    /// A fit with more interference than required.
    InterferenceAboveLimit = "interference-above-limit", Error;
    /// A gap or separation narrower than required.
    GapBelowLimit = "gap-below-limit", Error;
    /// A gap or separation wider than required.
    GapAboveLimit = "gap-above-limit", Error;
    /// A result below its limit.
    ResultBelowLimit = "result-below-limit", Error;
    /// A result above its limit.
    ResultAboveLimit = "result-above-limit", Error;
    /// A pressure or stress below its limit.
    StressBelowLimit = "stress-below-limit", Error;
    /// A pressure or stress above its limit.
    StressAboveLimit = "stress-above-limit", Error;
    /// A force or torque below its limit.
    ForceBelowLimit = "force-below-limit", Error;
    /// A force or torque above its limit.
    ForceAboveLimit = "force-above-limit", Error;
    /// A joining or loosening temperature below its limit.
    TemperatureBelowLimit = "temperature-below-limit", Error;
    /// A joining or loosening temperature above its limit.
    TemperatureAboveLimit = "temperature-above-limit", Error;
    /// A cavity with less free volume than required.
    UllageBelowLimit = "ullage-below-limit", Error;
    /// A cavity with more free volume than required.
    UllageAboveLimit = "ullage-above-limit", Error;
    /// A ring or member that yields, where elastic figures end.
    StressPastYield = "stress-past-yield", Error;
    /// A joint that neither heat nor cold makes within what the materials allow.
    JoiningOutOfReach = "joining-out-of-reach", Warning;
    /// A requirement that holds unless friction along the joint is counted.
    FrictionAlongSeat = "friction-along-seat", Warning;
    /// A part that turns, whose growth by rotation is not computed.
    SpeedWithoutEffect = "speed-without-effect", Warning;
    /// A charge that has no room left in its cavity.
    CavityFull = "cavity-full", Error;
    /// A pressure at which a charge is stiffer than it was at filling.
    BulkModulusGrows = "bulk-modulus-grows", Warning;
    /// A requirement that could be proven neither to hold nor to fail.
    NotDecided = "not-decided", Error;
    /// A spec without a record beside it, where one is asked for.
    RecordMissing = "record-missing", Error;
    /// A record that differs from what the spec gives now.
    RecordStale = "record-stale", Error;
    /// A requirement that holds with less room than asked for.
    ThinMargin = "thin-margin", Warning;
    /// A part colder or hotter than its material's data go.
    TemperatureOutsideData = "temperature-outside-data", Error;
    /// Figures beyond a material's data, as its `extrapolate` allows.
    DataExtrapolated = "data-extrapolated", Warning;
    /// A property that a quantity needs and a material does not state.
    MissingProperty = "missing-property", Error;
    /// Scatter in per cent of a coefficient of expansion near zero.
    RelativeScatterNearZero = "relative-scatter-near-zero", Warning;
    /// Free parts that would have to pass through each other.
    ContactBeyondFreeExpansion = "contact-beyond-free-expansion", Note;
    /// A set to select from that serves not every assembly.
    SelectionIncomplete = "selection-incomplete", Error;
    /// A departure that is accepted for now.
    ConcessionInForce = "concession-in-force", Note;
    /// A departure that was accepted once.
    ConcessionExpired = "concession-expired", Error;
    /// A departure greater than what was accepted.
    ConcessionExceeded = "concession-exceeded", Error;
    /// A concession for a requirement that holds.
    ConcessionUnused = "concession-unused", Warning;
}

impl std::fmt::Display for Code {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        f.write_str(self.text())
    }
}
