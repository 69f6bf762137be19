#include "scenario/yaml.hpp"

#include <algorithm>
#include <cmath>
#include <map>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/number.hpp"
#include "scenario/plain_text.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kLongestShownLine = 4096;

std::string kind_of(const YAML::Node& node) {
    if (node.IsMap()) return "a map";
    if (node.IsSequence()) return "a list";
    if (node.IsScalar()) return in_quotes(node.Scalar());
    return "nothing";
}

bool is_empty(const YAML::Node& node) {
    return !node.IsDefined() || node.IsNull();
}

/// A hint for what the blank after a colon would mend, else the usual one.
std::string hint_of_blank(const std::string& text, const std::string& hint) {
    const auto apart = with_blank_after_colon(text);
    return apart ? blank_hint(*apart) : hint;
}

/// The number's own hint where a comma stands in it, else the usual one.
std::string hint_of_comma(const std::string& text, const std::string& of_number,
                          const std::string& hint) {
    return text.find(',') != std::string::npos && !of_number.empty() ? of_number : hint;
}

/// Reports a value of the wrong kind.
void wrong_kind(const Reading& reading, const Entry& entry, const std::string& belongs,
                const std::string& hint) {
    if (is_empty(entry.value))
        reading.error(entry.mark(),
                      in_quotes(entry.key) + " is empty; " + belongs + " belongs here",
                      hint_of_blank(entry.key, hint));
    else
        reading.error(entry.mark(), belongs + " belongs here, not " + kind_of(entry.value),
                      entry.value.IsScalar() ? hint_of_blank(entry.value.Scalar(), hint) : hint);
}

std::string example_of(Dimension dimension) {
    return std::string(example_quantity(dimension));
}

/// A number without unit.
std::optional<double> read_number(const Reading& reading, const Entry& entry,
                                  const std::string& hint) {
    const auto text = read_text(reading, entry, hint);
    if (!text) return std::nullopt;
    const ParsedQuantity parsed = parse_bare_number(*text);
    if (!parsed.value)
        reading.error(entry.mark(), entry.key + ": " + parsed.problem,
                      hint_of_comma(*text, parsed.hint, hint));
    return parsed.value;
}

/// The number, unless it is too large to compute with, which is reported.
std::optional<double> small_enough(const Reading& reading, const Entry& entry,
                                   const std::optional<double>& number, const std::string& hint) {
    if (!number || std::abs(*number) <= kLargestValue) return number;
    reading.error(
        entry.mark(),
        entry.key + ": " + in_quotes(entry.value.Scalar()) + " is too large to compute with", hint);
    return std::nullopt;
}

/// The fraction probably meant by a percentage with its sign or without: "0.20" for "20".
std::optional<std::string> meant_fraction(const std::string& text) {
    const auto share = parse_share(text).value;
    if (!share) return std::nullopt;
    const bool has_sign = text.find('%') != std::string::npos;
    if (!has_sign && *share < 2.0) return std::nullopt;  // 1.2 is no likely percentage
    const double fraction = has_sign ? *share : *share / 100.0;
    if (!(fraction >= 0.0 && fraction <= 1.0)) return std::nullopt;
    std::string decimals = fixed(fraction, 2);
    return parse_number(decimals) == fraction ? decimals : shortest(fraction);
}

}  // namespace

Reading::Reading(std::string name, std::string text, Diagnostics& diagnostics, FileKind kind)
    : name_(std::move(name)), text_(std::move(text)), diagnostics_(&diagnostics), kind_(kind) {
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

std::string_view Reading::line(std::size_t index) const {
    if (index >= line_starts_.size()) return {};
    const std::size_t begin = line_starts_[index];
    const std::size_t end =
        index + 1 < line_starts_.size() ? line_starts_[index + 1] - 1 : text_.size();
    std::string_view line = std::string_view(text_).substr(begin, end - begin);
    if (line.ends_with('\r')) line.remove_suffix(1);
    return line;
}

std::string_view Reading::from(const YAML::Mark& mark) const {
    if (mark.is_null() || static_cast<std::size_t>(mark.line) >= line_starts_.size()) return {};
    const std::size_t byte =
        line_starts_[static_cast<std::size_t>(mark.line)] + static_cast<std::size_t>(mark.column);
    return std::string_view(text_).substr(std::min(byte, text_.size()));
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
                mark, in_quotes(key) + " is given twice in " + what,
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
                                     const std::string& hint, const std::string& takes) {
    if (is_empty(entry.value)) {
        reading.error(entry.mark(), in_quotes(entry.key) + " is empty",
                      hint_of_blank(entry.key, hint));
        return std::nullopt;
    }
    if (!entry.value.IsScalar()) {
        reading.error(entry.mark(),
                      in_quotes(entry.key) + " takes " + takes + ", not " + kind_of(entry.value),
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
        return refuse(in_quotes(*text) + " is below zero", "write zero or more");
    if (least == Least::above_zero && !(value > 0.0))
        return refuse(in_quotes(*text) + " is not above zero",
                      "write more than zero, such as '" + example_of(dimension) + "'");
    if (!(value <= kLargestValue))
        return refuse(in_quotes(*text) + " is too large to compute with",
                      "check the number and its unit");
    if (value > 0.0 && value < kSmallestValue)
        return refuse(in_quotes(*text) + " is too small to compute with",
                      "write 0, or check the number and its unit");
    return value;
}

std::optional<double> read_bare(const Reading& reading, const Entry& entry,
                                const std::string& hint) {
    const auto number = read_number(reading, entry, hint);
    if (number && !(*number >= 0.0)) {
        reading.error(entry.mark(),
                      entry.key + ": " + in_quotes(entry.value.Scalar()) + " is below zero", hint);
        return std::nullopt;
    }
    return small_enough(reading, entry, number, hint);
}

std::optional<double> read_signed(const Reading& reading, const Entry& entry,
                                  const std::string& hint) {
    return small_enough(reading, entry, read_number(reading, entry, hint), hint);
}

std::optional<double> read_fraction(const Reading& reading, const Entry& entry) {
    const std::string hint = "write a plain number from 0 to 1, such as 0.2";
    const auto text = read_text(reading, entry, hint);
    if (!text) return std::nullopt;
    const ParsedQuantity parsed = parse_bare_number(*text);
    const std::string problem =
        parsed.value ? in_quotes(*text) + " is not between 0 and 1" : parsed.problem;
    if (parsed.value && *parsed.value >= 0.0 && *parsed.value <= 1.0) return parsed.value;
    const auto meant = meant_fraction(*text);
    reading.error(entry.mark(), entry.key + ": " + problem,
                  meant ? "write " + *meant : hint_of_comma(*text, parsed.hint, hint));
    return std::nullopt;
}

std::optional<std::size_t> read_word(const Reading& reading, const Entry& entry, Words words) {
    std::string choices;
    for (const std::string_view word : words)
        choices += (choices.empty() ? "write " : " or ") + in_quotes(word);
    const auto text = read_text(reading, entry, choices);
    if (!text) return std::nullopt;
    const auto found = std::ranges::find(words, std::string_view(*text));
    if (found != words.end()) return static_cast<std::size_t>(found - words.begin());
    reading.error(entry.mark(), entry.key + ": " + in_quotes(*text) + " is not a choice here",
                  words.size() > 1 ? way_out(*text, words) : choices);
    return std::nullopt;
}

}  // namespace rainledger
