"""The sentences about a printed p: by which test, from which limits, and whether it goes with its interval."""

from __future__ import annotations

from fourcount.appraisal.findings import Finding
from fourcount.record.entry.readings import PrintedFigure
from fourcount.wording import check_names as names
from fourcount.wording import numbers

P_TEXTS = {
    "p-reproduced": "{printed} follows from {given} by {tests} ({ours}).",
    "p-from-limits": "{printed} goes with the printed limits, which give about {implied}.",
    "p-beside-interval": "Check p: {printed} {follows}stands beside {level} limits that {hold} no effect "
    "({no_effect}){and_others}. They may rest on different methods.",
    "p-differs": "Check p: {printed}, while {others}. Another test or an adjustment may explain it.",
    "p-zero": "No p is 0: {printed} can only mean less than {half}.",
    "p-unchecked": "{printed} cannot be checked: {why}.",
}
EVERY_TEST = "every test here"
SHOWN_TEST = "the test shown, {test}"
FOLLOWS_BUT = "follows from {given} by {tests} ({ours}), but "
AND_OTHERS = ": {others}"
NO_LIMITS, NO_WAY = "no limits are printed", "these limits do not give one"
HOLD = {1: "include", 0: "leave out"}
NEAREST_TEST = "the nearest test of {given}, {test}, gives {p}"
FROM_LIMITS = "the printed limits give about {p}"
BOTH = " and "
AND_BY = " and by "
SPAN = "{least} to {most}"


def p_text(finding: Finding, figure: PrintedFigure) -> str:
    """A finding about p as a sentence."""
    facts = finding.facts
    p, implied, level = facts.get("p"), facts.get("implied"), facts.get("level")
    others = _others(finding)
    parts = {
        "printed": printed_p(figure),
        "given": names.given_name(facts),
        "tests": _tests(finding),
        "ours": _span(_p_beside(p, figure), _p_beside(facts.get("p_most", p), figure)),
        "half": _p_beside(facts.get("half"), figure),
        "implied": _p_beside(implied, figure),
        "level": numbers.level(level) if isinstance(level, float) else "the",
        "hold": HOLD.get(int(facts.get("inside", 0)), ""),
        "no_effect": str(facts.get("no_effect", 1)),
        "others": others,
        "and_others": AND_OTHERS.format(others=others) if others else "",
        "why": NO_LIMITS if figure.low is None and figure.high is None else NO_WAY,
    }
    parts["follows"] = FOLLOWS_BUT.format_map(parts) if facts.get("source") == "p-reproduced" else ""
    return P_TEXTS[finding.key].format_map(parts)


def _tests(finding: Finding) -> str:
    """The tests that give the printed digits, the one in the window first and named as that."""
    found = names.test_names(str(finding.facts.get("tests", "")))
    if not found:
        return EVERY_TEST
    if finding.facts.get("shown"):
        found[0] = SHOWN_TEST.format(test=found[0]) + ("," if len(found) > 1 else "")
        rest = names.few(found[1:], names.AND, names.TESTS_KIND, most=1) if found[1:] else ""
        return f"{found[0]}{AND_BY}{rest}" if rest else found[0]
    return names.few(found, names.AND, names.TESTS_KIND)


def printed_p(figure: PrintedFigure) -> str:
    """The p in the digits of the print: p = 0.03, p < 0.001."""
    value = "…" if figure.p is None else names.as_printed(figure.p)
    return f"p {figure.p_relation} {value}"


def _p_beside(value: object, figure: PrintedFigure) -> str:
    """A p of ours with one decimal more than the printed one."""
    if not isinstance(value, int | float):
        return "…"
    decimals = 1 + (2 if figure.p is None else figure.p.decimals)
    least = 10.0**-decimals
    return numbers.plain(value, decimals) if value >= least / 2 else f"<{numbers.plain(least, decimals)}"


def _span(least: str, most: str) -> str:
    return least if least == most else SPAN.format(least=least, most=most)


def _p_alone(value: object) -> str:
    return numbers.p_value(value) if isinstance(value, int | float) else "…"


def _others(finding: Finding) -> str:
    facts, parts = finding.facts, []
    if "nearest" in facts:
        (test,) = names.test_names(str(facts["nearest"]))
        given = names.given_name(facts)
        parts.append(NEAREST_TEST.format(test=test, given=given, p=_p_alone(facts.get("p"))))
    if "implied" in facts:
        parts.append(FROM_LIMITS.format(p=_p_alone(facts["implied"])))
    return BOTH.join(parts)
