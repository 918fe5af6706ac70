"""The keys of methods and tests that other programs read. Written out here once, so that none is renamed unseen."""

from __future__ import annotations

METHOD_KEYS = {
    "risk": {"wilson", "wilson-continuity", "clopper-pearson", "mid-p", "wald", "logit", "agresti-coull", "jeffreys"},
    "risk_difference": {"newcombe", "miettinen-nurminen", "agresti-caffo", "wald"},
    "risk_ratio": {"koopman", "miettinen-nurminen", "katz"},
    "odds_ratio": {
        "baptista-pike-mid-p",
        "conditional-exact",
        "conditional-mid-p",
        "miettinen-nurminen",
        "woolf",
        "gart",
    },
}
TEST_KEYS = ("fisher", "fisher-mid-p", "pearson", "n-minus-1")

PAIR_METHOD_KEYS = {
    "pair_difference": {"newcombe", "tango", "wald"},
    "pair_ratio": {"bonett-price", "log"},
    "pair_odds_ratio": {"conditional-exact", "conditional-mid-p", "log"},
}
PAIR_TEST_KEYS = ("mcnemar-exact", "mcnemar-mid-p", "mcnemar", "mcnemar-corrected")

RATE_METHOD_KEYS = {
    "rate": {"exact", "mid-p", "score", "wald"},
    "rate_difference": {"miettinen-nurminen", "wald"},
    "rate_ratio": {"exact", "mid-p", "score", "log"},
}
RATE_TEST_KEYS = ("binomial-exact", "binomial-mid-p", "rate-score")

POOLED_METHOD_KEYS = {
    "pooled_risk_difference": {"sato", "greenland-robins"},
    "pooled_risk_ratio": {"greenland-robins"},
    "pooled_odds_ratio": {"robins-breslow-greenland"},
}
TIMED_METHOD_KEYS = {"timed_difference": {"square-and-add"}, "timed_ratio": {"square-and-add"}}
STRATA_TEST_KEYS = ("cmh", "cmh-corrected")
HOMOGENEITY_TEST_KEYS = ("breslow-day", "breslow-day-tarone")
RECOVERY_KEYS = ("recovery-limits", "recovery-p", "interaction")

PATIENT_KEYS = (
    "baseline",
    "effect",
    "risk_without",
    "risk_with",
    "difference",
    "number_needed",
    "risk_ratio",
    "range_from",
    "start_from",
    "start_interval",
    "start_level",
    "risk_without_interval",
    "measure",
    "carried",
    "adjusted",
    "adjusted_for",
    "level",
    "study_span",
    "other_span",
)
PATIENT_KEYS_OF_THREE = ("rank", "low", "high")
LINE_KEYS = ("kind", "measure", "value", "lies", "worse_side", "level")
LINE_KEYS_OF_A_MARGIN = ("p", "method", "parted")
