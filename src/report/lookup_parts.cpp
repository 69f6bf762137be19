#include "report/lookup_parts.hpp"

#include <algorithm>
#include <utility>

#include <fmt/core.h>

#include "report/text_table.hpp"

namespace rainledger {
namespace {

/// The next word of a text, which loses it and the blanks around it.
std::string_view take_word(std::string_view& text) {
    text.remove_prefix(std::min(text.find_first_not_of(' '), text.size()));
    const std::string_view word = text.substr(0, text.find(' '));
    text.remove_prefix(word.size());
    return word;
}

}  // namespace

std::string filled(std::string lead, std::string_view text, std::string_view hang,
                   std::size_t width) {
    std::string out;
    std::string line = std::move(lead);
    bool fresh = true;
    for (std::string_view word = take_word(text); !word.empty(); word = take_word(text)) {
        if (!fresh && shown_width(line) + 1 + shown_width(word) > width) {
            out += line + "\n";
            line = hang;
            fresh = true;
        }
        if (!fresh) line += ' ';
        line += word;
        fresh = false;
    }
    return out + line + "\n";
}

std::string plain_number(double value) {
    return fmt::format("{:.7g}", value);
}

std::string as_printed(double canonical, const ValueView& view) {
    if (!view.dimension) return plain_number(canonical);
    const auto unit = find_unit(view.printed_unit, *view.dimension);
    return plain_number(unit->from_canonical(canonical)) + " " + std::string(view.printed_unit);
}

std::string shown_value(double canonical, const ValueView& view, const Display& display) {
    return view.dimension ? display.parameter(canonical, *view.dimension) : four_figures(canonical);
}

std::string fault_words(const ValueView& view, const Display& display) {
    const PrintedFault& fault = *view.fault;
    std::string out(fault.words);
    if (fault.corrected) {
        const std::string shown = shown_value(*fault.corrected, view, display);
        const std::string printed = as_printed(*fault.corrected, view);
        out += "; corrected: " + shown;
        if (printed != shown) out += " (" + printed + ")";
    }
    if (fault.corrected_range)
        out += "; corrected range: " + shown_value(fault.corrected_range->low, view, display) +
               " to " + shown_value(fault.corrected_range->high, view, display);
    return out;
}

std::string short_citation(const Provenance& provenance) {
    return fmt::format("{} {}, {}", provenance.source->author, provenance.source->year,
                       provenance.place);
}

const ValueView& value_of(const RowView& row, std::string_view key) {
    return *std::ranges::find(row.values, key, &ValueView::key);
}

std::string yaml_comment(std::string_view words) {
    return filled("# ", words, "# ", kLookupWidth - kFragmentIndent);
}

}  // namespace rainledger
