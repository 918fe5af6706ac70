"""The choice of the form of print: specimens to choose from, each with what it stands for beside it."""

from __future__ import annotations

from PySide6.QtCore import Qt

from fourcount.face.fields import ChoiceField
from fourcount.face.look import Look
from fourcount.wording import labels


class FormChoice(ChoiceField):
    """Shows one specimen; its list says of each in a word or two what it is."""

    def __init__(self, look: Look) -> None:
        super().__init__(look, labels.FIELDS["form"], tuple(labels.FORMS.items()))
        self._dressed = False

    def showPopup(self) -> None:
        if not self._dressed:
            from fourcount.face.printed.specimens import SpecimenDelegate

            self._dressed = True
            for index in range(self.count()):
                note = labels.FORM_NOTES[self.itemData(index)]
                self.setItemData(index, note, Qt.ItemDataRole.StatusTipRole)
                self.setItemData(index, f"{self.itemText(index)}, {note}", Qt.ItemDataRole.AccessibleTextRole)
            self.setItemDelegate(SpecimenDelegate(self._look, self))
        self.view().setMinimumWidth(max(self.view().sizeHintForColumn(0), self.width()))
        super().showPopup()
