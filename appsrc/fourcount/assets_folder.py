"""Where the icon and the pictures of the README lie."""

from __future__ import annotations

from pathlib import Path


def assets_folder() -> Path:
    """The folder of the assets: inside the package where it is installed, at the top of the source tree otherwise."""
    package = Path(__file__).resolve().parent
    installed = package / "assets"
    return installed if installed.is_dir() else package.parents[1] / "assets"
