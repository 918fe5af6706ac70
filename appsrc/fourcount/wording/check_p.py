"""The sentences about a printed p: by which test, from which limits, and whether it goes with its interval."""

from __future__ import annotations

from fourcount.appraisal.findings import Finding
from fourcount.record.entry.readings import PrintedFigure
from fourcount.wording import check_names as names
from fourcount.wording import numbers

P_TEXTS = {
    "p-reproduced": "{printed} follows from the counts by {tests} ({ours}).",
    "p-from-limits": "{printed} goes with the printed limits, which give about {implied}.",
    "p-beside-interval": "Check p: {printed} stands beside {level} limits that {hold} no effect ({no_effect}); they "
    "may rest on different methods.",
    "p-differs": "Check p: {printed}, while {others}. Another test or an adjustment may explain it.",
    "p-zero": "No p is 0: {printed} can only mean less than {half}.",
    "p-unchecked": "There is nothing here to hold {printed} against.",
}
EVERY_TEST = "every test here"
HOLD = {1: "include", 0: "leave out"}
NEAREST_TEST = "the nearest test of the counts, {test}, gives {p}"
FROM_LIMITS = "the printed limits give about {p}"
BOTH = " and "
SPAN = "{least} to {most}"


def p_text(finding: Finding, figure: PrintedFigure) -> str:
    """A finding about p as a sentence."""
    facts = finding.facts
    p, implied, level = facts.get("p"), facts.get("implied"), facts.get("level")
    tests = str(facts.get("tests", ""))
    parts = {
        "printed": printed_p(figure),
        "tests": names.test_list(tests) if tests else EVERY_TEST,
        "ours": _span(_p_beside(p, figure), _p_beside(facts.get("p_most", p), figure)),
        "half": numbers.plain(half) if isinstance(half := facts.get("half"), float) else "…",
        "implied": _p_beside(implied, figure),
        "level": numbers.level(level) if isinstance(level, float) else "the",
        "hold": HOLD.get(int(facts.get("inside", 0)), ""),
        "no_effect": str(facts.get("no_effect", 1)),
        "others": _others(finding),
    }
    return P_TEXTS[finding.key].format_map(parts)


def printed_p(figure: PrintedFigure) -> str:
    """The p in the digits of the print: p = 0.03, p < 0.001."""
    value = "…" if figure.p is None else numbers.fixed(figure.p.value, figure.p.decimals)
    return f"p {figure.p_relation} {value}"


def _p_beside(value: object, figure: PrintedFigure) -> str:
    """A p of ours with one decimal more than the printed one."""
    if not isinstance(value, int | float):
        return "…"
    decimals = 2 if figure.p is None else figure.p.decimals
    return numbers.plain(value, decimals + 1) if value > 0 else "0"


def _span(least: str, most: str) -> str:
    return least if least == most else SPAN.format(least=least, most=most)


def _p_alone(value: object) -> str:
    return numbers.p_value(value) if isinstance(value, int | float) else "…"


def _others(finding: Finding) -> str:
    facts, parts = finding.facts, []
    if "nearest" in facts:
        test = names.test_list(str(facts["nearest"]))
        parts.append(NEAREST_TEST.format(test=test, p=_p_alone(facts.get("p"))))
    if "implied" in facts:
        parts.append(FROM_LIMITS.format(p=_p_alone(facts["implied"])))
    return BOTH.join(parts)
