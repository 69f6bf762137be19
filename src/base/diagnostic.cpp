#include "rainledger/base/diagnostic.hpp"

#include <algorithm>
#include <utility>

#include "rainledger/base/printable.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kShownColumns = 96;  // of a long source line
constexpr std::string_view kIndent = "    ";

bool is_continuation(char c) {
    return (static_cast<unsigned char>(c) & 0xC0U) == 0x80U;
}

/// The source line and the caret below it; a long line is cut to a window around the caret.
std::string caret_lines(const Place& place) {
    const std::string& line = place.source_line;
    const std::size_t target = std::min(place.column > 0 ? place.column - 1 : 0, line.size());
    std::size_t begin = 0;
    if (line.size() > kShownColumns && target > kShownColumns / 2)
        begin = std::min(target - kShownColumns / 2, line.size() - kShownColumns);
    std::size_t end = std::min(line.size(), begin + kShownColumns);
    while (begin > 0 && begin < line.size() && is_continuation(line[begin]))
        --begin;
    while (end < line.size() && is_continuation(line[end]))
        ++end;

    const std::string_view lead = begin > 0 ? "..." : "";
    std::string shown{lead};
    std::string window = line.substr(begin, end - begin);
    std::ranges::replace(window, '\t', ' ');
    shown += printable(window);
    if (end < line.size()) shown += "...";

    std::size_t pad = lead.size();
    for (std::size_t i = begin; i < target; ++i)
        if (!is_continuation(line[i])) ++pad;
    std::string out{kIndent};
    out += shown;
    out += '\n';
    out += kIndent;
    out.append(pad, ' ');
    out += "^\n";
    return out;
}

}  // namespace

void Diagnostics::add(Diagnostic diagnostic) {
    if (diagnostic.severity == Severity::error) ++errors_;
    list_.push_back(std::move(diagnostic));
}

void Diagnostics::error(Place place, std::string message, std::string hint) {
    add({Severity::error, Trouble::input, std::move(place), std::move(message), std::move(hint)});
}

void Diagnostics::warning(Place place, std::string message, std::string hint) {
    add({Severity::warning, Trouble::input, std::move(place), std::move(message), std::move(hint)});
}

void Diagnostics::unreadable(Place place, std::string message, std::string hint) {
    add({Severity::error, Trouble::unreadable, std::move(place), std::move(message),
         std::move(hint)});
}

SourceText::SourceText(std::string name, std::string text)
    : name_(std::move(name)), text_(std::move(text)) {}

Place SourceText::at(std::size_t line, std::size_t column) const {
    std::size_t begin = 0;
    for (std::size_t i = 1; i < line; ++i) {
        const std::size_t newline = text_.find('\n', begin);
        if (newline == std::string::npos) {
            begin = text_.size();
            break;
        }
        begin = newline + 1;
    }
    std::size_t end = std::min(text_.find('\n', begin), text_.size());
    if (end > begin && text_[end - 1] == '\r') --end;
    return {name_, line, column, text_.substr(begin, end - begin)};
}

std::string render(const Diagnostic& diagnostic, bool colour) {
    const Place& place = diagnostic.place;
    std::string out = printable(place.file);
    if (place.line > 0)
        out += ":" + std::to_string(place.line) + ":" + std::to_string(place.column);
    const bool is_error = diagnostic.severity == Severity::error;
    const std::string_view word = is_error ? "error" : "warning";
    out += ": ";
    if (colour) out += is_error ? "\x1b[31m" : "\x1b[33m";
    out += word;
    if (colour) out += "\x1b[0m";
    out += ": " + printable(diagnostic.message) + "\n";
    if (place.line > 0 && !place.source_line.empty()) out += caret_lines(place);
    if (!diagnostic.hint.empty()) {
        out += kIndent;
        out += printable(diagnostic.hint) + "\n";
    }
    return out;
}

}  // namespace rainledger
