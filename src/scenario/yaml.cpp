#include "scenario/yaml.hpp"

#include <algorithm>
#include <map>
#include <utility>

namespace rainledger {
namespace {

constexpr std::size_t kLongestShownLine = 4096;

std::string quoted(std::string_view text) {
    return "'" + std::string(text) + "'";
}

std::string kind_of(const YAML::Node& node) {
    if (node.IsMap()) return "a map";
    if (node.IsSequence()) return "a list";
    if (node.IsScalar()) return quoted(node.Scalar());
    return "nothing";
}

bool is_empty(const YAML::Node& node) {
    return !node.IsDefined() || node.IsNull();
}

/// Reports a value of the wrong kind.
void wrong_kind(const Reading& reading, const Entry& entry, const std::string& belongs,
                const std::string& hint) {
    if (is_empty(entry.value))
        reading.error(entry.mark(), quoted(entry.key) + " is empty; " + belongs + " belongs here",
                      hint);
    else
        reading.error(entry.mark(), belongs + " belongs here, not " + kind_of(entry.value), hint);
}

std::string example_of(Dimension dimension) {
    return std::string(example_quantity(dimension));
}

}  // namespace

Reading::Reading(std::string name, std::string text, Diagnostics& diagnostics)
    : name_(std::move(name)), text_(std::move(text)), diagnostics_(&diagnostics) {
    line_starts_.push_back(0);
    for (std::size_t i = 0; i < text_.size(); ++i)
        if (text_[i] == '\n') line_starts_.push_back(i + 1);
}

Place Reading::at_line(std::size_t line, std::size_t column) const {
    const std::size_t begin = line <= line_starts_.size() ? line_starts_[line - 1] : text_.size();
    std::size_t end = std::min(text_.find('\n', begin), text_.size());
    if (end > begin && text_[end - 1] == '\r') --end;
    // A whole scenario on one line must not be copied for each of its places.
    if (end - begin > kLongestShownLine) return {name_, line, column, {}};
    return {name_, line, column, text_.substr(begin, end - begin)};
}

Place Reading::at(const YAML::Mark& mark) const {
    if (mark.is_null() || mark.line < 0 || mark.column < 0) return {name_, 0, 0, {}};
    return at_line(static_cast<std::size_t>(mark.line) + 1,
                   static_cast<std::size_t>(mark.column) + 1);
}

Place Reading::at_byte(std::size_t byte) const {
    const auto next = std::ranges::upper_bound(line_starts_, byte);
    const auto line = static_cast<std::size_t>(next - line_starts_.begin());
    return at_line(line, byte - line_starts_[line - 1] + 1);
}

void Reading::error(const YAML::Mark& mark, std::string message, std::string hint) const {
    diagnostics_->error(at(mark), std::move(message), std::move(hint));
}

void Reading::warning(const YAML::Mark& mark, std::string message, std::string hint) const {
    diagnostics_->warning(at(mark), std::move(message), std::move(hint));
}

YAML::Mark Entry::mark() const {
    // The mark of an empty value is that of the token after it, which may be anywhere.
    if (is_empty(value) || value.Mark().is_null()) return key_mark;
    return value.Mark();
}

std::vector<Entry> entries_of(const Reading& reading, const Entry& map, const std::string& what) {
    std::vector<Entry> entries;
    std::map<std::string, int> first_lines;
    for (const auto& pair : map.value) {
        const YAML::Mark mark = pair.first.Mark();
        if (!pair.first.IsScalar()) {
            reading.error(is_empty(pair.first) ? map.key_mark : mark,
                          "a key in " + what + " is not a plain word",
                          "write 'key: value', one to a line");
            continue;
        }
        const std::string& key = pair.first.Scalar();
        const auto [earlier, is_new] = first_lines.emplace(key, mark.line + 1);
        if (is_new)
            entries.push_back({key, mark, pair.second});
        else
            reading.error(
                mark, quoted(key) + " is given twice in " + what,
                "keep one of them; the other is on line " + std::to_string(earlier->second));
    }
    return entries;
}

bool is_map(const Reading& reading, const Entry& entry, const std::string& what,
            const std::string& hint) {
    if (entry.value.IsDefined() && entry.value.IsMap()) return true;
    wrong_kind(reading, entry, what, hint);
    return false;
}

bool is_list(const Reading& reading, const Entry& entry, const std::string& what,
             const std::string& hint) {
    if (entry.value.IsDefined() && entry.value.IsSequence()) return true;
    wrong_kind(reading, entry, what, hint);
    return false;
}

std::optional<std::string> read_text(const Reading& reading, const Entry& entry,
                                     const std::string& hint) {
    if (is_empty(entry.value)) {
        reading.error(entry.mark(), quoted(entry.key) + " is empty", hint);
        return std::nullopt;
    }
    if (!entry.value.IsScalar()) {
        reading.error(entry.mark(),
                      quoted(entry.key) + " takes a single value, not " + kind_of(entry.value),
                      hint);
        return std::nullopt;
    }
    return entry.value.Scalar();
}

std::optional<double> read_quantity(const Reading& reading, const Entry& entry, Dimension dimension,
                                    Least least) {
    const auto text = read_text(reading, entry,
                                "write a number with a unit, such as '" + example_of(dimension) +
                                    "' (units: " + std::string(accepted_units(dimension)) + ")");
    if (!text) return std::nullopt;
    const ParsedQuantity parsed = parse_quantity(*text, dimension);
    const auto refuse = [&](const std::string& problem, const std::string& hint) {
        reading.error(entry.mark(), entry.key + ": " + problem, hint);
        return std::nullopt;
    };
    if (!parsed.value) return refuse(parsed.problem, parsed.hint);
    const double value = *parsed.value;
    if (least == Least::zero && !(value >= 0.0))
        return refuse(quoted(*text) + " is below zero", "write zero or more");
    if (least == Least::above_zero && !(value > 0.0))
        return refuse(quoted(*text) + " is not above zero",
                      "write more than zero, such as '" + example_of(dimension) + "'");
    if (!(value <= kLargestValue))
        return refuse(quoted(*text) + " is too large to compute with",
                      "check the number and its unit");
    return value;
}

std::optional<double> read_bare(const Reading& reading, const Entry& entry,
                                const std::string& hint) {
    const auto text = read_text(reading, entry, hint);
    if (!text) return std::nullopt;
    const ParsedQuantity parsed = parse_bare_number(*text);
    const auto refuse = [&](const std::string& problem) {
        reading.error(entry.mark(), entry.key + ": " + problem, hint);
        return std::nullopt;
    };
    if (!parsed.value) return refuse(parsed.problem);
    if (!(*parsed.value >= 0.0)) return refuse(quoted(*text) + " is below zero");
    if (!(*parsed.value <= kLargestValue))
        return refuse(quoted(*text) + " is too large to compute with");
    return parsed.value;
}

std::optional<double> read_fraction(const Reading& reading, const Entry& entry) {
    const std::string hint = "write a plain number from 0 to 1, such as 0.2";
    const auto text = read_text(reading, entry, hint);
    if (!text) return std::nullopt;
    const ParsedQuantity parsed = parse_bare_number(*text);
    const std::string problem =
        parsed.value ? quoted(*text) + " is not between 0 and 1" : parsed.problem;
    if (parsed.value && *parsed.value >= 0.0 && *parsed.value <= 1.0) return parsed.value;
    reading.error(entry.mark(), entry.key + ": " + problem, hint);
    return std::nullopt;
}

std::optional<std::size_t> read_word(const Reading& reading, const Entry& entry, Words words) {
    std::string choices;
    for (const std::string_view word : words)
        choices += (choices.empty() ? "write " : " or ") + quoted(word);
    const auto text = read_text(reading, entry, choices);
    if (!text) return std::nullopt;
    const auto found = std::ranges::find(words, std::string_view(*text));
    if (found != words.end()) return static_cast<std::size_t>(found - words.begin());
    reading.error(entry.mark(), entry.key + ": " + quoted(*text) + " is not a choice here",
                  words.size() > 1 ? way_out(*text, words) : choices);
    return std::nullopt;
}

}  // namespace rainledger
