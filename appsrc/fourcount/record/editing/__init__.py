"""What a hand can do to a record. Each action gives a new outcome or record and leaves the old one as it was.

Nothing else in the package replaces a field: ``msgspec.structs.replace`` checks no types, so what goes into it is
checked here.
"""

from __future__ import annotations

from fourcount.record.editing.choosing import (
    clear_table,
    count_other_outcome,
    swap_groups,
    with_adjusted_measure,
    with_choices,
    with_counting,
    with_design,
    with_family,
    with_follow_up_varied,
    with_layout,
    with_level,
    with_outcome,
    with_paper_measure,
    with_welcome,
    with_where,
)
from fourcount.record.editing.for_patient import (
    with_certainty,
    with_effect,
    with_line_kind,
    with_line_scale,
    with_line_side,
    with_on_handout,
    with_start_kind,
)
from fourcount.record.editing.forms import in_form
from fourcount.record.editing.outcomes import (
    MOST_OUTCOMES,
    add_outcome,
    copy_outcome,
    move_outcome,
    remove_outcome,
)
from fourcount.record.editing.pasting import brings_another_table, take_paste
from fourcount.record.editing.stratum_rows import add_stratum, remove_stratum, with_of_total
from fourcount.record.editing.texts import (
    OUTCOME_TEXTS,
    PATIENT_TEXTS,
    RECORD_TEXTS,
    STRATUM_TEXTS,
    edit_record_text,
    edit_text,
    typed_texts,
)

__all__ = [
    "MOST_OUTCOMES", "OUTCOME_TEXTS", "PATIENT_TEXTS", "RECORD_TEXTS", "STRATUM_TEXTS", "add_outcome", "add_stratum",
    "brings_another_table", "clear_table", "copy_outcome", "count_other_outcome", "edit_record_text", "edit_text",
    "in_form", "move_outcome", "remove_outcome", "remove_stratum", "swap_groups", "take_paste", "typed_texts",
    "with_adjusted_measure", "with_certainty", "with_choices", "with_counting", "with_design", "with_effect",
    "with_family", "with_follow_up_varied", "with_layout", "with_level", "with_line_kind", "with_line_scale",
    "with_line_side", "with_of_total", "with_on_handout", "with_outcome", "with_paper_measure", "with_start_kind",
    "with_welcome", "with_where",
]  # fmt: skip
