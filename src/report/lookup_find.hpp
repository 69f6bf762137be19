#pragma once

#include <algorithm>
#include <span>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/suggest.hpp"
#include "rainledger/reference/names.hpp"
#include "rainledger/report/lookup_topics.hpp"

// Rows by a name that was typed.
namespace rainledger {

/// True if `name` mentions every word that was typed, in any order; punctuation alone is no word.
[[nodiscard]] inline bool mentions_all(std::string_view name, std::string_view typed) {
    while (!typed.empty()) {
        const std::string_view word = typed.substr(0, typed.find_first_of(" -_,"));
        typed.remove_prefix(std::min(word.size() + 1, typed.size()));
        if (same_name(word, word) && !mentions(name, word)) return false;
    }
    return true;
}

/// The rows whose name, as it is shown, mentions every word typed, in the table's order.
template <typename Row>
[[nodiscard]] std::vector<const Row*> rows_with_words(std::span<const Row> rows,
                                                      std::string_view typed) {
    std::vector<const Row*> found;
    for (const Row& row : rows)
        if (mentions_all(view_of(row).name, typed)) found.push_back(&row);
    return found;
}

/// The refusal of a name that no row has: the nearest one, or where they all stand.
template <typename T, typename Row>
[[nodiscard]] Answer<T> unknown_name(std::span<const Row> rows, std::string_view topic,
                                     std::string_view typed) {
    const auto near = nearest(typed, names_of(rows));
    const std::string hint = near ? "did you mean '" + std::string(*near) + "'?"
                                  : "'rainledger lookup " + std::string(topic) + "' shows them all";
    return refusal<T>("no row is named " + in_quotes(typed), hint);
}

/// The rows of that name, else those that mention it; every row where none was typed.
template <typename Row>
[[nodiscard]] Answer<std::vector<const Row*>> rows_asked(std::span<const Row> rows,
                                                         std::string_view topic,
                                                         std::string_view typed) {
    if (typed.empty()) {
        std::vector<const Row*> all;
        for (const Row& row : rows)
            all.push_back(&row);
        return {std::move(all), {}, {}};
    }
    auto found = rows_named(rows, typed);
    if (!same_name(typed, typed)) return unknown_name<std::vector<const Row*>>(rows, topic, typed);
    if (found.empty()) found = rows_with_words(rows, typed);
    if (found.empty()) return unknown_name<std::vector<const Row*>>(rows, topic, typed);
    return {std::move(found), {}, {}};
}

/// A sentence naming the rows that mention what was typed and are not shown; may be empty.
template <typename Row>
[[nodiscard]] std::string others_line(std::span<const Row> rows,
                                      const std::vector<const Row*>& shown,
                                      std::string_view typed) {
    std::vector<std::string_view> names;
    if (!typed.empty())
        for (const Row* row : rows_with_words(rows, typed))
            if (std::ranges::none_of(shown,
                                     [&](const Row* other) { return other->name == row->name; }) &&
                std::ranges::find(names, row->name) == names.end())
                names.push_back(row->name);
    std::string out;
    for (const std::string_view name : names)
        out += (out.empty() ? "See also: " : "; ") + std::string(name);
    return out.empty() ? out : out + ".";
}

template <typename Row>
[[nodiscard]] std::vector<RowView> views_of(const std::vector<const Row*>& rows) {
    std::vector<RowView> views;
    for (const Row* row : rows)
        views.push_back(view_of(*row));
    return views;
}

/// Adds a sentence that may be empty.
inline void add_line(LookupSection& section, std::string line) {
    if (!line.empty()) section.lines.push_back(std::move(line));
}

[[nodiscard]] inline LookupAnswer refused(std::string problem, std::string hint = {}) {
    return refusal<std::vector<LookupSection>>(std::move(problem), std::move(hint));
}

/// One section alone as an answer.
[[nodiscard]] inline LookupAnswer answered(LookupSection section) {
    std::vector<LookupSection> sections;
    sections.push_back(std::move(section));
    return {std::move(sections), {}, {}};
}

}  // namespace rainledger
