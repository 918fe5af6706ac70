"""The family and level last chosen by hand: a new table and the next start take these, not what one paper used."""

from __future__ import annotations

from msgspec.structs import replace

from fourcount.face.session import Session
from fourcount.record.paper import Choices


class OwnChoices:
    """Follows a session's choices; those that a record brought with it are left out."""

    def __init__(self, session: Session) -> None:
        self._session = session
        self.choices = session.record.choices
        self._seen = self.choices
        self._brought: set[Choices] = set()
        session.changed.connect(self._on_changed)

    def bring(self, choices: Choices) -> None:
        """These choices come with a record: its worked example, or the paper's own method."""
        self._brought.add(choices)

    def choose(self, choices: Choices) -> None:
        """These choices are somebody's own now, whatever brought them before."""
        self._brought.discard(choices)

    def _on_changed(self) -> None:
        now, before = self._session.record.choices, self._seen
        self._seen = now
        if now == before or now in self._brought:
            return
        own = self.choices
        self.choices = replace(
            own,
            family=now.family if now.family != before.family else own.family,
            level=now.level if now.level != before.level else own.level,
        )
