#include "rain/statistics_labels.hpp"

#include <cstddef>

#include "rain/csv_text.hpp"
#include "rainledger/base/number.hpp"
#include "rainledger/base/unit_spellings.hpp"

namespace rainledger {
namespace {

std::string_view without_colon(std::string_view text) {
    if (text.ends_with(':')) text.remove_suffix(1);
    return trimmed(text);
}

/// A number and the word behind it, which a blank or a hyphen may part from it.
struct NumberAndWord {
    double number = 0.0;
    std::string_view word;
};

std::optional<NumberAndWord> number_and_word(std::string_view text) {
    const std::size_t end = text.find_first_not_of("0123456789.");
    const auto number = parse_number(text.substr(0, end));
    if (!number) return std::nullopt;
    if (end == std::string_view::npos) return NumberAndWord{*number, {}};
    std::string_view word = text.substr(end);
    if (word.starts_with('-')) word.remove_prefix(1);
    word = trimmed(word);
    if (word.empty()) return std::nullopt;
    return NumberAndWord{*number, word};
}

/// A unit in the spelling used here, whatever its spelling was.
std::optional<Unit> unit_in_any_spelling(std::string_view text, Dimension dimension) {
    if (const auto unit = find_unit(text, dimension)) return unit;
    const auto meant = meant_unit(text, dimension);
    return meant ? find_unit(*meant, dimension) : std::nullopt;
}

}  // namespace

LabelParts take_apart_label(std::string_view label) {
    label = without_colon(label);
    for (const auto& [opening, closing] : {std::pair{'[', ']'}, std::pair{'(', ')'}}) {
        const std::size_t at = label.rfind(opening);
        if (at == std::string_view::npos || !label.ends_with(closing)) continue;
        return {trimmed(label.substr(0, at)), trimmed(label.substr(at + 1, label.size() - at - 2))};
    }
    return {label, std::nullopt};
}

std::string_view unit_part(std::string_view cell) {
    const LabelParts parts = take_apart_label(cell);
    return parts.unit.value_or(parts.name);
}

std::optional<DurationLabel> duration_in(std::string_view label) {
    const auto parts = number_and_word(without_colon(label));
    if (!parts || !(parts->number > 0.0)) return std::nullopt;
    if (parts->word.empty()) return DurationLabel{parts->number, std::nullopt};
    const auto unit = time_unit_of(parts->word);
    if (!unit) return std::nullopt;
    return DurationLabel{parts->number, unit};
}

std::optional<Unit> time_unit_of(std::string_view text) {
    return unit_in_any_spelling(text, Dimension::time);
}

std::optional<PeriodLabel> period_in(std::string_view label) {
    const auto parts = number_and_word(without_colon(label));
    if (!parts) return std::nullopt;
    if (parts->word.empty()) return PeriodLabel{parts->number, false};
    if (!unit_in_any_spelling(parts->word, Dimension::frequency)) return std::nullopt;
    return PeriodLabel{parts->number, true};
}

std::optional<ValueUnit> value_unit_of(std::string_view text) {
    if (const auto rate = unit_in_any_spelling(text, Dimension::rate))
        return ValueUnit{std::string(text), *rate, true};
    if (const auto depth = unit_in_any_spelling(text, Dimension::depth))
        return ValueUnit{std::string(text), *depth, false};
    return std::nullopt;
}

bool is_same_unit(const ValueUnit& one, const ValueUnit& other) {
    return one.is_rate == other.is_rate &&
           one.unit.to_canonical(1.0) == other.unit.to_canonical(1.0);
}

}  // namespace rainledger
