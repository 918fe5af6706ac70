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
from fourcount.wording import check_texts as texts
from fourcount.wording import labels, numbers
from fourcount.wording.check_p import P_TEXTS, p_text
from fourcount.wording.facts import quoted

Facts = dict[str, Fact]


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
    template = texts.TEXTS.get(finding.key, texts.UNKNOWN)
    return template.format_map(_Parts(finding.facts, figure))


def cell_text(finding: Finding) -> str:
    """A finding about a percentage that stands beside a count, as a sentence."""
    facts = finding.facts
    if finding.key == "other-counts":
        return texts.TEXTS[finding.key].format_map({name: _whole(value) for name, value in facts.items()})
    share = facts.get("own")
    parts = {
        "text": quoted(str(facts.get("text", ""))),
        "percent": str(facts.get("percent", "")),
        "total": _whole(facts.get("total")),
        "events": _whole(facts.get("events")),
        "fitting": _whole(facts.get("fitting")),
        "share": numbers.percent(share) if isinstance(share, float) else "…",
    }
    return texts.TEXTS[finding.key].format_map(parts)


def adopt_text(adopt: tuple[str, float]) -> str:
    """What the command that adopts the paper's methods does."""
    family, level = adopt
    return texts.ADOPT.format(family=labels.FAMILIES.get(family, family).lower(), level=numbers.level(level))


def _line(finding: Finding, text: str) -> CheckLine:
    return CheckLine(key=finding.key, text=text, agrees=finding.agrees, note=finding.key in texts.NOTES)


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

    def _given(self) -> str:
        return names.given_name(self._facts)

    def _method_names(self, prefix: str = "") -> list[str]:
        found = (self._text_of(f"{prefix}{part}") for part in ("methods", "halved"))
        return names.method_names(self._text_of("base"), *found)

    def _methods(self) -> str:
        return names.few(self._method_names(), names.OR, names.METHODS_KIND)

    def _level(self) -> str:
        return _level(self._facts.get("level"))

    def _by(self) -> str:
        found = self._method_names()
        if not found:
            return ""
        if not self._facts.get("shown"):
            return texts.BY.format(methods=self._methods(), level=self._level())
        rest = (
            texts.REST.format(methods=names.few(found[1:], names.OR, names.METHODS_KIND, most=1)) if found[1:] else ""
        )
        return texts.BY_SHOWN.format(first=found[0], rest=rest, level=self._level())

    def _gives(self) -> str:
        return texts.GIVE[len(self._method_names()) > names.MOST_NAMED]

    def _turned(self) -> str:
        if not self._side():
            return ""
        estimate = self._facts.get("estimate")
        return texts.REDUCTION if isinstance(estimate, int | float) and estimate >= 0 else texts.OTHER_SIGN

    def _crude(self) -> str:
        return texts.CRUDE.format(name=self._name(), ours=self._ours()) if "estimate" in self._facts else ""

    def _instead(self) -> str:
        """What a table gives beside a printed hazard ratio."""
        if "estimate" not in self._facts:
            return ""
        return (texts.FITS_AS_WELL if self._facts.get("fits") else texts.INSTEAD).format_map(self)

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
        if "own_low" in self._facts:
            value = f"{value} ({names.our_limits(self._figure, self._facts, 'own_')})"
        if self._text_of("measure").startswith(names.UNCLUSTERED):
            return texts.OWN_CLUSTERED.format(value=value)
        if not measure:
            return value
        same = measure == self._text_of("measure")
        return (
            texts.OWN_AS_ENTERED.format(value=value)
            if same
            else texts.OWN.format(name=names.measure_name(measure), value=value)
        )

    def _what(self) -> str:
        """What there is to check where only another level fits: by the place of the match, also its name or side."""
        place = self._facts.get("place")
        return texts.AT_ANOTHER_LEVEL.get(place if isinstance(place, int) else 0, texts.ALL_OF_THEM)

    def _called(self) -> str:
        return texts.CALLED.format(says=self._says()) if self._facts.get("place") in (1, 3) else ""

    def _not_level(self) -> str:
        level = self._facts.get("printed_level")
        return texts.NO_LEVEL if level is None else texts.NOT_LEVEL.format(level=_level(level))

    def _nearest(self) -> str:
        if "low" not in self._facts:
            return texts.NO_METHOD_GIVEN
        limits = names.our_limits(self._figure, self._facts)
        if "shown_low" not in self._facts:
            template = texts.NEAREST_SHOWN if self._facts.get("shown") else texts.NEAREST
            return template.format(methods=self._methods(), level=self._level(), limits=limits)
        (method,) = self._method_names("shown_")
        shown = names.our_limits(self._figure, self._facts, "shown_")
        told = texts.NEAREST_SHOWN.format(methods=method, level=self._level(), limits=shown)
        return told if shown == limits else told + texts.NEAREST_TOO.format(methods=self._methods(), limits=limits)

    def _limit(self) -> str:
        return texts.LIMITS.get(self._text_of("limit"), "")

    def _one(self) -> str:
        return names.ours(self._facts.get(self._text_of("limit")), self._wrong_limit())

    def _printed_one(self) -> str:
        limit = self._wrong_limit()
        return "…" if limit is None else names.as_printed(limit)

    def _wrong_limit(self) -> PrintedNumber | None:
        return self._figure.low if self._text_of("limit") == "low" else self._figure.high

    def _slip(self) -> str:
        return texts.SLIP if self._facts.get("slip") else ""

    def _chance(self) -> str:
        return texts.CHANCE if self._facts.get("coarse") else ""

    def _scale(self) -> str:
        return texts.LOG_SCALE if self._facts.get("log_scale") else ""

    def _mirrored(self) -> str:
        figure, facts = self._figure, self._facts
        if figure.low is None or figure.high is None:
            return ""
        pairs = []
        if "mirrored_high" in facts:
            pairs.append((names.as_printed(figure.low), _same(facts, "mirrored_high", figure)))
        if "mirrored_low" in facts:
            pairs.append((_same(facts, "mirrored_low", figure), names.as_printed(figure.high)))
        told = names.listed([f"{low}{numbers.TO}{high}" for low, high in pairs], names.OR) if pairs else ""
        return texts.MIRRORED.format(pairs=told) if told else ""

    def _slips(self) -> str:
        parts = [
            template.format(text=self._text_of(f"slip_{part}"))
            for part, template in texts.PARTS.items()
            if f"slip_{part}" in self._facts
        ]
        return texts.SLIPS.format(parts=names.listed(parts, names.OR)) if parts else ""

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
