"""Whether a paper's figures add up, in sentences: what the print says, what the counts give, and by which method.

It says "check". What does not follow may rest on an adjustment, on other people or on a slip of print, and the program
cannot know which.
"""

from __future__ import annotations

from dataclasses import dataclass

from fourcount.appraisal.findings import CheckFindings, FigureCheck, Finding
from fourcount.record.entry.readings import PrintedFigure, PrintedNumber
from fourcount.stats.results import Fact
from fourcount.wording import check_names as names
from fourcount.wording import labels, numbers
from fourcount.wording.check_p import P_TEXTS, p_text
from fourcount.wording.facts import quoted

Facts = dict[str, Fact]

BY = " by {methods} at {level}"
TEXTS = {
    "reproduced": "{printed} follows from the counts: the {name} is {ours}{by}.",
    "other-name": "Check the name: {printed}, printed as {says}, fits the {name}, {ours}{by}{own}.{chance}",
    "other-way-round": "Check which way round: {printed} fits the {name} {side}, {ours}{by}{own}.{chance}",
    "other-name-and-way": "Check the name and which way round: {printed}, printed as {says}, fits the {name} {side}, "
    "{ours}{by}{own}.{chance}",
    "other-level": "Check the level: {printed} fits the {name}{sided} at {level}, {ours}, by {methods}{not_level}."
    "{chance}",
    "other-analysis": "Check the analysis: {printed} fits the {name}{sided}, {ours}{by}{own}.{chance}",
    "also-fits": "It also fits the {name}{sided}, {ours}{by}.",
    "estimate-only": "The estimate follows from the counts; check the limits: {nearest}. An adjusted model, or another "
    "method or level, may be behind the printed ones.",
    "estimate-other-name": "Check the name: the estimate, printed as {says}, fits the {name}, {ours}{own}; no method "
    "here gives the printed limits.",
    "estimate-other-analysis": "Check the analysis: the estimate fits the {name}{sided}, {ours}{own}; no method here "
    "gives the printed limits.",
    "estimate-other-way": "Check which way round: the estimate fits the {name} {side}, {ours}{own}; no method here "
    "gives the printed limits.",
    "estimate-other-name-and-way": "Check the figure: its estimate fits the {name} {side}, {ours}{own}, which may be "
    "chance.",
    "one-limit": "Check the {limit} limit: {methods} at {level} gives {one}, not {printed_one}, while the other "
    "limit and the estimate fit{slip}.",
    "interval-only": "Check the estimate: the limits are those of the {name}{sided}{by}, and its estimate is "
    "{estimate}{slip}.",
    "cut-off": "Check the last digits: the {name} is {ours}{by}, and the print leaves the further digits off instead "
    "of rounding.",
    "last-digit": "Check the last digit: the {name} is {ours}{by}; rounding on the way there would explain it.",
    "nearest": "Check {printed}: the counts give {ours}{by} for the {name}. An adjustment, or other denominators, may "
    "explain it.",
    "adjusted": "{printed} is printed as adjusted and need not follow from the counts, whose crude {name} is {ours}.",
    "adjusted-is-crude": "Check the adjustment: {printed}, printed as adjusted, is the crude {name}, {ours}{by}.",
    "no-hazard-ratio": "Counts alone give no hazard ratio: it needs the times of the events.",
    "symmetric": "The limits lie evenly round the estimate{scale}, as those of most methods do.",
    "not-symmetric": "Check the limits: they do not lie evenly round the estimate{scale}{mirrored}{slips}. Score, "
    "exact and profile intervals need not.",
    "limits-disordered": "Check the limits: the estimate does not lie between them.",
    "percent-none": "Check the percentage: no whole number of {total} gives {printed}; {events} of {total} is {own}.",
    "percent-none-of-total": "Check {text}: no whole number of {total} gives {percent}%; {events} of {total} is "
    "{share}.",
    "other-counts": "Check the counts: the print follows from {first} of {first_total} and {second} of {second_total}, "
    "for instance, which round to the same percentages; the figures here are those of {first_taken} and "
    "{second_taken}.",
    "percent-other-count": "Check {text}: {percent}% of {total} is {fitting}, while {events} is {share}.",
}
"""One sentence for every finding but those about p."""

NOTES = ("adjusted", "no-hazard-ratio", "p-unchecked", "p-zero")
"""Findings that neither confirm the print nor ask to check it."""

NO_METHOD_GIVEN = "no method here gives limits"
NEAREST = "{methods} at {level} gives {limits}"
OWN = ", while the {name} is {value}"
OWN_AS_ENTERED = ", while as entered it is {value}"
NOT_LEVEL = ", while the print says {level}"
NO_LEVEL = ", and the print names no level"
SLIP = "; two of its digits may have changed places"
CHANCE = " So few digits may fit by chance."
LOG_SCALE = " on the log scale"
MIRRORED = ": {pairs} would be even"
SLIPS = ", and so would {parts}, with two digits in each other’s place"
PARTS = {"low": "a lower limit of {text}", "high": "an upper limit of {text}", "estimate": "an estimate of {text}"}
LIMITS = {"low": "lower", "high": "upper"}
ADOPT = "Show this record with {family} intervals at {level}, as the paper does"
UNKNOWN = "Check {printed}."


@dataclass(frozen=True, kw_only=True, slots=True)
class CheckLine:
    """One sentence of a check; ``agrees`` where it asks for nothing to be looked at.

    A ``note`` neither confirms anything nor asks for anything.
    """

    key: str
    text: str
    agrees: bool
    note: bool = False


def check_lines(found: CheckFindings) -> tuple[CheckLine, ...]:
    """All sentences of a check: of the printed figures in their order, then of percentages beside the counts."""
    told = tuple(line for figure in found.figures for line in figure_lines(figure))
    return told + tuple(_line(finding, cell_text(finding)) for finding in found.cells)


def figure_lines(figure: FigureCheck) -> tuple[CheckLine, ...]:
    """The sentences about one printed figure."""
    return tuple(_line(finding, finding_text(finding, figure.printed)) for finding in figure.findings)


def finding_text(finding: Finding, figure: PrintedFigure) -> str:
    """One finding about a printed figure as a sentence."""
    if finding.key in P_TEXTS:
        return p_text(finding, figure)
    template = TEXTS.get(finding.key, UNKNOWN)
    return template.format_map(_Parts(finding.facts, figure))


def cell_text(finding: Finding) -> str:
    """A finding about a percentage that stands beside a count, as a sentence."""
    facts = finding.facts
    if finding.key == "other-counts":
        return TEXTS[finding.key].format_map({name: _whole(value) for name, value in facts.items()})
    share = facts.get("own")
    parts = {
        "text": quoted(str(facts.get("text", ""))),
        "percent": str(facts.get("percent", "")),
        "total": _whole(facts.get("total")),
        "events": _whole(facts.get("events")),
        "fitting": _whole(facts.get("fitting")),
        "share": numbers.percent(share) if isinstance(share, float) else "…",
    }
    return TEXTS[finding.key].format_map(parts)


def adopt_text(adopt: tuple[str, float]) -> str:
    """What the command that adopts the paper's methods does."""
    family, level = adopt
    return ADOPT.format(family=labels.FAMILIES.get(family, family).lower(), level=numbers.level(level))


def _line(finding: Finding, text: str) -> CheckLine:
    return CheckLine(key=finding.key, text=text, agrees=finding.agrees, note=finding.key in NOTES)


def _whole(value: Fact | None) -> str:
    return numbers.whole(value) if isinstance(value, int) else "…"


class _Parts(dict[str, str]):
    """The parts that the sentences about a figure are made of; each is made when a sentence asks for it."""

    def __init__(self, facts: Facts, figure: PrintedFigure) -> None:
        super().__init__()
        self._facts, self._figure = facts, figure

    def __missing__(self, name: str) -> str:
        maker = getattr(self, f"_{name}", None)
        return maker() if maker is not None else "…"

    def _text_of(self, name: str) -> str:
        return str(self._facts.get(name, ""))

    def _printed(self) -> str:
        return names.printed_text(self._figure)

    def _says(self) -> str:
        return names.with_article(names.measure_name(self._figure.measure))

    def _name(self) -> str:
        return names.measure_name(self._text_of("measure"))

    def _ours(self) -> str:
        return names.our_figure(self._figure, self._facts)

    def _estimate(self) -> str:
        return names.our_estimate(self._figure, self._facts)

    def _methods(self) -> str:
        return names.method_list(self._text_of("base"), self._text_of("methods"))

    def _level(self) -> str:
        return _level(self._facts.get("level"))

    def _by(self) -> str:
        return BY.format(methods=self._methods(), level=self._level()) if self._text_of("methods") else ""

    def _side(self) -> str:
        return names.side_name(self._text_of("orientation"), self._text_of("base"))

    def _sided(self) -> str:
        side = self._side()
        return f" {side}" if side else ""

    def _own(self) -> str:
        """What the print's own measure is as entered; of a percentage, our own share."""
        if "own" not in self._facts:
            return ""
        value, measure = names.our_estimate(self._figure, self._facts, "own"), self._text_of("own_measure")
        if not measure:
            return value
        same = measure == self._text_of("measure")
        return OWN_AS_ENTERED.format(value=value) if same else OWN.format(name=names.measure_name(measure), value=value)

    def _not_level(self) -> str:
        level = self._facts.get("printed_level")
        return NO_LEVEL if level is None else NOT_LEVEL.format(level=_level(level))

    def _nearest(self) -> str:
        if "low" not in self._facts:
            return NO_METHOD_GIVEN
        limits = names.our_limits(self._figure, self._facts)
        return NEAREST.format(methods=self._methods(), level=self._level(), limits=limits)

    def _limit(self) -> str:
        return LIMITS.get(self._text_of("limit"), "")

    def _one(self) -> str:
        return names.ours(self._facts.get(self._text_of("limit")), self._wrong_limit())

    def _printed_one(self) -> str:
        limit = self._wrong_limit()
        return "…" if limit is None else numbers.fixed(limit.value, limit.decimals)

    def _wrong_limit(self) -> PrintedNumber | None:
        return self._figure.low if self._text_of("limit") == "low" else self._figure.high

    def _slip(self) -> str:
        return SLIP if self._facts.get("slip") else ""

    def _chance(self) -> str:
        return CHANCE if self._facts.get("coarse") else ""

    def _scale(self) -> str:
        return LOG_SCALE if self._facts.get("log_scale") else ""

    def _mirrored(self) -> str:
        figure, facts = self._figure, self._facts
        if figure.low is None or figure.high is None:
            return ""
        pairs = []
        if "mirrored_high" in facts:
            pairs.append((numbers.fixed(figure.low.value, figure.low.decimals), _same(facts, "mirrored_high", figure)))
        if "mirrored_low" in facts:
            pairs.append((_same(facts, "mirrored_low", figure), numbers.fixed(figure.high.value, figure.high.decimals)))
        told = names.listed([f"{low}{numbers.TO}{high}" for low, high in pairs], names.OR) if pairs else ""
        return MIRRORED.format(pairs=told) if told else ""

    def _slips(self) -> str:
        parts = [
            template.format(text=self._text_of(f"slip_{part}"))
            for part, template in PARTS.items()
            if f"slip_{part}" in self._facts
        ]
        return SLIPS.format(parts=names.listed(parts, names.OR)) if parts else ""

    def _total(self) -> str:
        return _whole(self._facts.get("total"))

    def _events(self) -> str:
        return _whole(self._facts.get("events"))


def _level(value: Fact | None) -> str:
    return numbers.level(value) if isinstance(value, float) else "…"


def _same(facts: Facts, name: str, figure: PrintedFigure) -> str:
    """A limit with as many decimals as the print gives its limits."""
    value, printed = facts[name], figure.low or figure.high
    if not isinstance(value, int | float) or printed is None:
        return "…"
    return numbers.plain(value, printed.decimals)
