"""Every visible word, by key, and the one place where a value becomes text."""
