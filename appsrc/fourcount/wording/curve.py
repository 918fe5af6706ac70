"""The words of the curve: its axes, the names at the ends of its lines, what it says in sentences."""

from __future__ import annotations

from typing import NamedTuple

from fourcount.appraisal.findings import Carriable, Gap, OutcomeFindings
from fourcount.appraisal.findings.curve import Curve, CurveLine, CurveMark, CurvePoint
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Record
from fourcount.wording import limits, names, numbers
from fourcount.wording.effects import carriable_name
from fourcount.wording.gaps import gap_text
from fourcount.wording.lines.as_printed import carried_texts
from fourcount.wording.subject import subject

NO_EFFECT = "no difference"
ODDS_ITSELF = "the {name} itself"
STUDY = "the study"
PATIENT = "this patient"
BOTH = "the study and this patient"
SHORT = {STUDY: "study", PATIENT: "patient", BOTH: "study and patient"}
"""Beside a point there is little room."""

FROM_HERE = "; at starting {risk}s over {start} the {risk} would pass 100%"
UP_TO_HERE = "; at starting {risk}s under {start} the {risk} would fall below 0%"
RATIO_AXIS = "{ratio} with the odds ratio kept constant (logarithmic axis)"
RISKS_VIEW = "Risk with: {name} and its interval"
RATIOS_VIEW = "{name} as a {ratio}"

KEEPS_ODDS = "The {name} is kept the same at every starting {risk}. That is an assumption: no study shows it."
KEEPS = "Each line keeps one effect the same at every starting {risk}. That is an assumption: no study shows it."
BAND = "The band is the {level} of the {name} at each starting {risk}, which is taken as certain there."
NO_BAND = "The {name} has no interval here, so it has no band."
OPEN_BAND = "Where one limit would pass 100%, or fall below 0%, only the other one is drawn."
BAR = "The bar on a point is the interval that the patient is told."
OTHER_SPAN = "Drawn for the study’s own time span: the patient’s figures for another one stand in the window."
RATIO_TEXT = (
    "The same {name} is a {ratio} near the {name} itself at starting {risk}s near 0%, and one near 1 at those near "
    "100%."
)
LEFT_OUT = "Not drawn: the {name}, which gives no line."
NO_POINT = "The patient at {start} has no point here: {why}."
NOBODY = "No patient has a point here. {why}"
ACROSS_AND_UP = "Across: {across}. Upwards: {up}."
LINES = "Lines: {names}."
NOTHING = "No effect of this table can be carried to another starting risk, so there is nothing to draw."
AT_START = "At a starting {risk} of {start}"
STUDY_OWN = ", the study’s own"
KEPT = "{value} with the {name}{kept}"
KEPT_CONSTANT = " kept constant"
WHICHEVER = "{value}, whichever effect is kept constant"
CONVERTED = "the {name} is a {ratio} of {value}"
GONE = {
    "beyond-one": "with the {name} the {risk} would pass 100%",
    "carried-beyond-zero": "with the {name} the {risk} would fall below 0%",
}
UNDETERMINED = "nothing follows from the {name}"
NOT_GIVEN = "not given"


class View(NamedTuple):
    """What is drawn: risks with or, with ``ratios``, odds ratios as risk ratios; and whose interval is the band."""

    ratios: bool = False
    place: int = 0


class CurveWords(NamedTuple):
    """Every text of one drawing; ``names`` are those of its lines, ``marks`` those of its points, in their orders.

    ``reference`` names the line of no difference, ``itself`` that of an odds ratio taken for a risk ratio.
    ``sentence`` says what the drawing shows at the points, ``notes`` what it rests on.
    """

    heading: str
    title: str
    across: str
    up: str
    reference: str
    itself: str
    names: tuple[str, ...]
    marks: tuple[str, ...]
    sentence: str
    notes: tuple[str, ...]

    @property
    def described(self) -> str:
        """All of it in full, whatever the drawing has room for."""
        if not self.names:
            return " ".join(self.notes)
        axes = ACROSS_AND_UP.format(across=self.across, up=self.up)
        return " ".join((axes, LINES.format(names=". ".join(self.names)), self.sentence, *self.notes))


def views(outcome: Outcome, curve: Curve) -> list[tuple[View, str]]:
    """What can be drawn, the effect that is carried first."""
    order = sorted(range(len(curve.lines)), key=lambda place: place != curve.carried)
    risk = names.sentence_case(names.risk_name(outcome))
    found = [
        (View(False, place), RISKS_VIEW.format(name=carriable_name(outcome, curve.lines[place].effect)))
        for place in order
    ]
    found = [(view, text if risk == "Risk" else text.replace("Risk", risk, 1)) for view, text in found]
    ratio = names.effect_name(outcome, "risk_ratio")
    for place, line in enumerate(curve.ratios):
        name = names.sentence_case(carriable_name(outcome, line.effect))
        found.append((View(True, place), RATIOS_VIEW.format(name=name, ratio=ratio)))
    return found


def shown_lines(curve: Curve, view: View) -> tuple[CurveLine, ...]:
    """The lines that a view draws."""
    return (curve.ratios[view.place],) if view.ratios else curve.lines


def curve_words(record: Record, outcome: Outcome, findings: OutcomeFindings, curve: Curve, view: View) -> CurveWords:
    """All texts of one view."""
    lines, spoken = shown_lines(curve, view), subject(outcome)
    risk, span = names.risk_name(outcome), names.over_span(outcome)
    with_span = f", {span}" if span else ""
    across = f"Starting {risk}, {names.in_group(spoken, 'reference')}{with_span}"
    up = f"{names.sentence_case(risk)} {names.in_group(spoken, 'index')}{with_span}"
    ratio = names.sentence_case(names.effect_name(outcome, "risk_ratio"))
    heads = (names.outcome_name(outcome), record.title_text.strip(), record.source_text.strip())
    return CurveWords(
        heading=" · ".join(names.bare(head) for head in heads if head),
        title=f"Across starting {risk}s: {names.event_words(spoken)}",
        across=across,
        up=RATIO_AXIS.format(ratio=ratio) if view.ratios else up,
        reference=NO_EFFECT,
        itself=ODDS_ITSELF.format(name=carriable_name(outcome, lines[0].effect)) if view.ratios else "",
        names=tuple(_line_name(outcome, line, view, curve) for line in lines),
        marks=tuple(_mark_name(mark) for mark in curve.marks),
        sentence=" ".join(_at(outcome, curve, view, mark) for mark in curve.marks or _middle(curve)) if lines else "",
        notes=_notes(outcome, findings, curve, view),
    )


def name_and_value(outcome: Outcome, one: Carriable) -> str:
    """``risk ratio 0.54``."""
    value, _ = carried_texts(one.effect, outcome, one.figure, adjusted=one.adjusted)
    per = " per 100" if one.effect == "risk_difference" else ""
    return f"{carriable_name(outcome, one)} {value}{per}"


def _line_name(outcome: Outcome, line: CurveLine, view: View, curve: Curve) -> str:
    """The name at a line's end; that of the band's line has the interval too, and says where the line ends."""
    text = name_and_value(outcome, line.effect)
    chosen = view.ratios or line is curve.lines[view.place]
    one = line.effect
    if chosen and not isinstance(one.figure.interval, Gap):
        level = limits.interval_name(one.level)
        interval = carried_texts(one.effect, outcome, one.figure, adjusted=one.adjusted)[1]
        text += f" ({level} {interval})"
    risk = names.risk_name(outcome)
    if line.last < curve.reach:
        text += FROM_HERE.format(risk=risk, start=numbers.percent(line.last))
    if line.first > 0:
        text += UP_TO_HERE.format(risk=risk, start=numbers.percent(line.first))
    return text


def _whose(mark: CurveMark) -> str:
    if mark.of_study:
        return BOTH if mark.of_patient else STUDY
    return PATIENT


def mark_words(mark: CurveMark, *, short: bool = False) -> str:
    """Whose point it is: ``this patient, low``."""
    whose = _whose(mark)
    return ", ".join(part for part in (SHORT[whose] if short else whose, mark.rank) if part)


def _mark_name(mark: CurveMark) -> str:
    """``patient, 12%``."""
    return f"{mark_words(mark, short=True)}, {start_text(mark)}"


def start_text(mark: CurveMark) -> str:
    """The starting risk of a point, the patient's with the digits that it was given."""
    return numbers.percent(mark.without) if mark.of_study else numbers.percent_given(mark.without)


def _middle(curve: Curve) -> tuple[CurveMark]:
    """Where no point is marked, the middle of the axis is told."""
    none = Gap("bare-starting-risk")
    start = curve.reach / 2
    return (CurveMark(of_study=False, of_patient=False, rank="", without=start, with_=none, low=none, high=none),)


def _at(outcome: Outcome, curve: Curve, view: View, mark: CurveMark) -> str:
    """``At a starting risk of 12%: 6.5% with the risk ratio kept constant, 6.3% with the odds ratio.``"""
    risk, own = names.risk_name(outcome), STUDY_OWN if mark.of_study else ""
    lines = shown_lines(curve, view)
    found = [(carriable_name(outcome, line.effect), point_at(line, mark.without).value) for line in lines]
    given = [(name, numbers.percent(value)) for name, value in found if not isinstance(value, Gap)]
    if view.ratios:
        ratio = names.effect_name(outcome, "risk_ratio")
        parts = [CONVERTED.format(name=name, ratio=ratio, value=_written(value)) for name, value in found]
    elif len(given) == len(found) > 1 and len({text for _, text in given}) == 1:
        parts = [WHICHEVER.format(value=given[0][1])]
    else:
        parts = [
            KEPT.format(value=text, name=name, kept="" if place else KEPT_CONSTANT)
            for place, (name, text) in enumerate(given)
        ]
        parts += [_why_gone(outcome, name, value) for name, value in found if isinstance(value, Gap)]
    return f"{AT_START.format(risk=risk, start=start_text(mark))}{own}: {', '.join(parts)}."


def _why_gone(outcome: Outcome, name: str, gap: Gap) -> str:
    return GONE.get(gap.key, UNDETERMINED).format(name=name, risk=names.risk_name(outcome))


def _written(value: float | Gap) -> str:
    return NOT_GIVEN if isinstance(value, Gap) else numbers.ratio(value)


def _notes(outcome: Outcome, findings: OutcomeFindings, curve: Curve, view: View) -> tuple[str, ...]:
    lines = shown_lines(curve, view)
    if not lines:
        return (NOTHING,)
    risk, one = names.risk_name(outcome), lines[0 if view.ratios else view.place].effect
    name, ratio = carriable_name(outcome, one), names.effect_name(outcome, "risk_ratio")
    found = [KEEPS_ODDS.format(name=name, risk=risk) if view.ratios else KEEPS.format(risk=risk)]
    if view.ratios:
        found.append(RATIO_TEXT.format(name=name, ratio=ratio, risk=risk))
    if isinstance(one.figure.interval, Gap):
        found.append(NO_BAND.format(name=name))
    else:
        level = limits.interval_name(one.level)
        found.append(BAND.format(level=level, name=name, risk=risk))
    if not view.ratios:
        chosen = lines[view.place]
        if any(
            isinstance(end, Gap) and end.key in limits.WITHHELD_ENDS
            for point in chosen.points
            for end in (point.low, point.high)
        ):
            found.append(OPEN_BAND)
        if view.place == curve.carried and any(_barred(mark) for mark in curve.marks):
            found.append(BAR)
    found += _pointless(outcome, findings, curve, lines[0 if view.ratios else view.place], view)
    if not isinstance(findings.patient, Gap) and findings.patient.other_span is not None:
        found.append(OTHER_SPAN)
    found += [LEFT_OUT.format(name=carriable_name(outcome, left)) for left in curve.left_out]
    return tuple(found)


def _pointless(outcome: Outcome, findings: OutcomeFindings, curve: Curve, chosen: CurveLine, view: View) -> list[str]:
    """Why a patient has no point."""
    if isinstance(findings.patient, Gap):
        return [NOBODY.format(why=gap_text(findings.patient))]
    name, found = carriable_name(outcome, chosen.effect), []
    for mark in curve.marks:
        value = point_at(chosen, mark.without).value
        on_the_line = view.ratios or not mark.of_study
        if mark.of_patient and on_the_line and isinstance(value, Gap):
            found.append(NO_POINT.format(start=start_text(mark), why=_why_gone(outcome, name, value)))
    return found


def _barred(mark: CurveMark) -> bool:
    """Whether a point has the limits that a patient is told."""
    return mark.of_patient and not isinstance(mark.low, Gap) and not isinstance(mark.high, Gap)


def point_at(line: CurveLine, start: float) -> CurvePoint:
    """The point at a starting risk, the nearest one where none is just there."""
    return min(line.points, key=lambda point: abs(point.start - start))
