#pragma once

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

// Located diagnostics. Readers collect them over the whole input; only the command line turns them
// into text and exit statuses.
namespace rainledger {

enum class Severity { error, warning };

/// What a diagnostic is about: the content of an input, or a file that could not be read at all.
enum class Trouble { input, unreadable };

/// A place in an input file. Line and column count from 1; line 0 means the file as a whole.
struct Place {
    std::string file;
    std::size_t line = 0;
    std::size_t column = 0;   ///< in bytes of the line
    std::string source_line;  ///< the line's text, for the caret; may be empty
};

struct Diagnostic {
    Severity severity = Severity::error;
    Trouble trouble = Trouble::input;
    Place place;
    std::string message;  ///< what is wrong, one line, no full stop
    std::string hint;     ///< what to write instead; may be empty
};

/// A growing list of diagnostics.
class Diagnostics {
public:
    void error(Place place, std::string message, std::string hint = {});
    void warning(Place place, std::string message, std::string hint = {});
    void unreadable(Place place, std::string message, std::string hint = {});

    [[nodiscard]] bool has_errors() const { return errors_ > 0; }
    [[nodiscard]] std::size_t error_count() const { return errors_; }
    [[nodiscard]] const std::vector<Diagnostic>& list() const { return list_; }

private:
    void add(Diagnostic diagnostic);

    std::vector<Diagnostic> list_;
    std::size_t errors_ = 0;
};

/// The text of one input file, from which places are cut.
class SourceText {
public:
    SourceText() = default;
    SourceText(std::string name, std::string text);

    /// The place at `line` and `column` (both from 1), with the line's text.
    [[nodiscard]] Place at(std::size_t line, std::size_t column) const;
    [[nodiscard]] const std::string& name() const { return name_; }
    [[nodiscard]] const std::string& text() const { return text_; }

private:
    std::string name_;
    std::string text_;
};

/// A diagnostic as text: "FILE:LINE:COLUMN: error: MESSAGE", then the offending line with a caret,
/// then the hint, each on lines of their own and ending in a newline. Control characters of the
/// input are shown as '?'.
[[nodiscard]] std::string render(const Diagnostic& diagnostic, bool colour = false);

}  // namespace rainledger
