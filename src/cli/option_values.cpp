#include "cli/option_values.hpp"

#include <algorithm>
#include <array>

#include "rainledger/base/suggest.hpp"
#include "rainledger/chart/chart.hpp"

namespace rainledger {
namespace {

bool is_unit(std::string_view word) {
    constexpr std::array kTaken{Dimension::time, Dimension::depth, Dimension::frequency};
    return std::ranges::any_of(
        kTaken, [&](Dimension dimension) { return find_unit(word, dimension).has_value(); });
}

}  // namespace

std::string input_problem(const Arguments& arguments, const InputWord& input) {
    const auto& words = arguments.words;
    const std::string noun(input.noun);
    if (words.empty()) {
        std::string upper = noun;
        std::ranges::transform(upper, upper.begin(),
                               [](char c) { return static_cast<char>(c - 'a' + 'A'); });
        return "no " + noun + " given; write 'rainledger " + std::string(input.command) + " " +
               upper + "'";
    }
    if (words.front().empty()) return "the name of the " + noun + " is empty";
    if (words.size() == 1) return {};
    std::string out = "one " + noun + " at a time; '" + words[1] + "' is one word too many";
    if (input.takes_quantity && is_unit(words[1])) out += " (" + std::string(input.one_word) + ")";
    return out;
}

std::string read_units(const Arguments& arguments, DisplayUnits& units) {
    const std::string* text = arguments.find("units");
    if (text == nullptr) return {};
    if (*text != "mm" && *text != "in")
        return "--units: '" + *text + "' is not known; write mm or in";
    units = *text == "in" ? DisplayUnits::inches : DisplayUnits::metric;
    return {};
}

std::string read_amount(const Arguments& arguments, std::string_view option, Dimension dimension,
                        std::string_view noun, std::optional<double>& amount, Zero zero) {
    const std::string* text = arguments.find(option);
    if (text == nullptr) return {};
    const std::string lead = "--" + std::string(option) + ": ";
    const ParsedQuantity parsed = parse_quantity(*text, dimension);
    if (!parsed.value) return lead + parsed.problem + "; " + parsed.hint;
    if (!(*parsed.value > 0.0) && !(zero == Zero::allowed && *parsed.value == 0.0))
        return lead + "'" + *text + "' is no " + std::string(noun) + "; it must be " +
               (zero == Zero::allowed ? "zero or more" : "above zero");
    amount = parsed.value;
    return {};
}

std::string unknown_word(std::string_view option, const std::string& text,
                         std::span<const std::string_view> names) {
    return "--" + std::string(option) + ": '" + text + "' is not known; " + suggestion(text, names);
}

void read_text(const Arguments& arguments, std::string_view option,
               std::optional<std::string>& text) {
    if (const std::string* given = arguments.find(option)) text = *given;
}

std::string chart_problem(const std::optional<std::string>& path) {
    if (!path || chart_format(*path)) return {};
    return "--chart: the ending of '" + *path +
           "' is none of .svg, .png, .pdf and .txt; '-' draws text on standard output";
}

}  // namespace rainledger
