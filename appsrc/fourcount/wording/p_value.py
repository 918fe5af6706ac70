"""The sentence of the p: its value, the test behind it, and what it does not say."""

from __future__ import annotations

from fourcount.appraisal.findings import Gap, Homogeneity, OutcomeFindings, Probability, StrataFindings
from fourcount.record.outcome import Form
from fourcount.stats.methods import homogeneity_test, test
from fourcount.wording import numbers
from fourcount.wording.form import NO_COUNTS
from fourcount.wording.gaps import gap_text

NO_P = "There is no p: "
P_FOLLOWS = "The p value takes a moment and will follow."
NO_TEST = "Two printed risks have no p of their own; the interval of their difference tells as much."
NOT_THE_SIZE = "It does not say how large the effect is; the intervals do."
WITHIN_STRATA = ", within strata"
WITH = " with "
BY_TEST = "{p}, two-sided ({title})."
RECOVERED = "{p}, two-sided (worked out from the printed figures alone)."
ONE_FOR_ALL = (
    "Whether one odds ratio may hold in all strata: {p} by the {title} (chi-square {chi_square} on {degrees}). "
    "A small p speaks against it; a large one does not show it."
)
PRINTED = ("printed", "recovered")


def own_p(findings: OutcomeFindings) -> Probability | Gap:
    """The p that is shown: within strata where there are any."""
    strata = findings.strata
    return strata.test if isinstance(strata, StrataFindings) else findings.test


def p_sentence(findings: OutcomeFindings) -> str:
    """The p of the family's own test with the test's name, and what it does not say."""
    probability = own_p(findings)
    if isinstance(probability, Gap):
        return why_no_p(probability)
    if isinstance(probability.p, Gap):
        return P_FOLLOWS if probability.p.key == "follows" else f"{NO_P}{clause(gap_text(probability.p))}"
    said = _by_test(probability.p, probability.method, findings.form)
    return " ".join(part for part in (said, NOT_THE_SIZE, _homogeneity(findings.strata)) if part)


def why_no_p(gap: Gap) -> str:
    """Why a form, or a table, has no p."""
    return NO_TEST if gap.key == NO_COUNTS else gap_text(gap)


def test_title(key: str) -> str:
    """A test's name inside brackets."""
    title = test(key).title.replace("(", "").replace(")", "")
    return f"{title[:1].lower()}{title[1:]}" if title.startswith(("Score ", "Conditional ")) else title


test_title.__test__ = False  # type: ignore[attr-defined]  # pytest would collect a function of this name


def _with_test(title: str) -> str:
    """The word "test" behind the test's own name, before what it is done with."""
    name, link, rest = title.partition(WITH)
    return f"{name}{'' if name.endswith('test') else ' test'}{link}{rest}"


def clause(sentence: str) -> str:
    """A sentence that goes on behind a colon."""
    return sentence[:1].lower() + sentence[1:]


def _by_test(p: float, method: str, form: Form) -> str:
    phrase = numbers.p_phrase(p)
    if method in PRINTED:
        return RECOVERED.format(p=phrase)
    return BY_TEST.format(p=phrase, title=f"{test_title(method)}{WITHIN_STRATA if form == 'strata' else ''}")


def _homogeneity(strata: StrataFindings | Gap | None) -> str:
    """Whether the strata's odds ratios may be one and the same."""
    if not isinstance(strata, StrataFindings):
        return ""
    found = strata.homogeneity
    return homogeneity_sentence(found) if isinstance(found, Homogeneity) else gap_text(found)


def homogeneity_sentence(found: Homogeneity) -> str:
    """Chi-square, its degrees of freedom and p of one odds ratio for all strata."""
    word = "degree" if found.degrees == 1 else "degrees"
    return ONE_FOR_ALL.format(
        p=numbers.p_phrase(found.p),
        title=_with_test(homogeneity_test(found.method).title),
        chi_square=numbers.fixed(found.chi_square, 2),
        degrees=f"{found.degrees} {word} of freedom",
    )
