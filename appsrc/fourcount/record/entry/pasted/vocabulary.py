"""Words by which printed sentences and tables say what a number is of."""

from __future__ import annotations

from fourcount.record.entry.word_list import EVENT_NOUNS, words

__all__ = ["EVENT_NOUNS"]

PEOPLE = frozenset(
    words(
        "patients patient participants participant people persons person individuals subjects subject women woman "
        "men man children child infants babies newborns neonates adults adolescents residents volunteers mothers "
        "boys girls cases controls pregnancies members recipients students workers nurses users smokers nonsmokers "
        "veterans survivors births deliveries eyes knees hips limbs legs teeth procedures operations admissions "
        "patients' enrollees attendees respondents inpatients outpatients toddlers pupils players runners "
        "households donors carers employees teenagers elders seniors pilots drivers clients"
    )
)
GROUP_NOUNS = frozenset(words("group groups arm arms cohort cohorts"))
ARTICLES = frozenset(words("the a an"))
COMPARATORS = frozenset(words("versus vs v compared than against whereas while relative"))
JOINERS = frozenset(words("and or but with whereas while versus vs v compared than against to"))
INTRODUCERS = frozenset(
    words(
        "invited in with on receiving received receive given assigned allocated randomised randomized taking took "
        "using used under without after before for from treated at among having who undergoing wearing offered not"
    )
)
LINKING = frozenset(
    words(
        "fewer more the a an those who were was had been being of all these patients participants people women men "
        "children adults residents individuals subjects infants babies volunteers to receive be have group arm "
        "then that persons"
    )
)
VERBS = frozenset(
    words(
        "had have has were was died die developed reported needed experienced underwent required suffered did fell "
        "relapsed recovered healed stopped achieved met gave lost reached responded withdrew dropped improved "
        "became became returned survived vomited bled remained contracted attained showed discontinued failed quit "
        "delivered sustained progressed chose completed presented complained admitted readmitted noted slept "
        "missed tripped coughed fainted felt went woke slept moved attended"
    )
)
HAPPENED = frozenset(
    words(
        "occurred occurs occur developed happened seen reported recorded observed noted present diagnosed found "
        "detected documented identified appeared arose affected healed resolved recurred failed confirmed "
        "experienced needed required achieved reached persisted returned given performed described registered "
        "followed common rose decreased increased declined"
    )
)
BE = frozenset(words("was were is are had has been be did"))
TIME_UNITS = frozenset(
    words("second seconds minute minutes min hour hours h day days d week weeks wk month months mo year years yr yrs")
)
SPAN_WORDS = frozenset(words("at by within over during after through in for"))
DETERMINERS = frozenset(words("the all its these those their our a total"))

NOT_PEOPLE = frozenset(
    words(
        "score scores scored scoring scale scales page pages chapter chapters table tables figure figures mmhg "
        "volume issue acuity version grade visual vision systolic diastolic dollars euros pounds season seasons "
        "rating ratings rated lesson lessons mark marks appendix supplement verse vas apgar lanes titre titer titers "
        "titres dilution percentile domains criteria reviewers"
    )
)
"""Words in whose neighbourhood a number of a number is no count of people."""

NOT_COUNTED = NOT_PEOPLE | frozenset(
    words(
        "mm mg ml kg g cm l questions question item items point points dose doses centres centers hospitals sites "
        "countries studies trials articles papers records stars sections section reads step steps tablets tablet "
        "capsules cups teaspoons tests wells plates channels copies sessions visits bpm percentiles fraction "
        "fractions clinics schools wards villages practices regions states samples specimens measurements chapters "
        "guidelines"
    )
)
"""Nouns that, right behind a number, say that it counts no people."""

TIME_OF_PEOPLE = frozenset(words("years year months month weeks week days day hours hour"))
_SHORT_TIMES = frozenset(words("py pys pyr pyrs p-y person-yr person-yrs patient-yr patient-yrs"))
_WHOSE_TIME = frozenset(
    words(
        "person patient participant woman women child man people resident catheter device line ventilator bed cow "
        "subject infant nurse user implant employee player athlete worker pump tube admission family household "
        "animal"
    )
)


def time_of_people(first: str, second: str) -> int:
    """How many of two words are a unit of person-time ("person-years", "patient days"); 0 where they are none."""
    if first in _SHORT_TIMES:
        return 1
    whose, _, unit = first.rpartition("-")
    if whose and unit in TIME_OF_PEOPLE and not whose[0].isdigit() and whose not in ("mid", "end"):
        return 1
    return 2 if first in _WHOSE_TIME and second in TIME_OF_PEOPLE else 0
