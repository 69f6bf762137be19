#pragma once

#include <cstddef>
#include <optional>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include <yaml-cpp/yaml.h>

#include "rainledger/base/diagnostic.hpp"
#include "rainledger/base/quantity.hpp"
#include "scenario/words.hpp"

// A small strict reader on top of the YAML nodes: closed maps, located problems, numbers by the
// program's own reader. Every function reports what is wrong and goes on.
namespace rainledger {

/// What a file is, in messages, and how one begins.
struct FileKind {
    std::string_view noun;
    std::string_view example;
};
inline constexpr FileKind kScenarioFile{
    "scenario", "a scenario starts with 'storm:' and 'surfaces:', each a map of its own"};
inline constexpr FileKind kFieldTestFile{
    "field test", "a field test names its readings, as in 'readings: pit3.csv'"};

/// The text being read, from which places are cut, and where its problems go.
class Reading {
public:
    /// `name` stands for the file in messages and gives the folder for relative paths.
    Reading(std::string name, std::string text, Diagnostics& diagnostics,
            FileKind kind = kScenarioFile);

    [[nodiscard]] const std::string& name() const { return name_; }
    [[nodiscard]] const FileKind& kind() const { return kind_; }
    [[nodiscard]] const std::string& text() const { return text_; }
    [[nodiscard]] Diagnostics& diagnostics() const { return *diagnostics_; }

    /// The place of a mark; the file as a whole for a mark of nothing.
    [[nodiscard]] Place at(const YAML::Mark& mark) const;
    /// The place of a byte of the text.
    [[nodiscard]] Place at_byte(std::size_t byte) const;
    /// The text from a mark to the end; nothing for a mark of nothing.
    [[nodiscard]] std::string_view from(const YAML::Mark& mark) const;
    /// A line of the text without its end, counted from 0; nothing beyond the last.
    [[nodiscard]] std::string_view line(std::size_t index) const;

    void error(const YAML::Mark& mark, std::string message, std::string hint = {}) const;
    void warning(const YAML::Mark& mark, std::string message, std::string hint = {}) const;

private:
    [[nodiscard]] Place at_line(std::size_t line, std::size_t column) const;

    std::string name_;
    std::string text_;
    Diagnostics* diagnostics_;
    FileKind kind_;
    std::vector<std::size_t> line_starts_;
};

/// A value with the words that name it: a key of a map, or an entry of a list ("depths, entry 3").
struct Entry {
    std::string key;
    YAML::Mark key_mark;
    YAML::Node value;

    /// Where the value stands; where its key stands if it is empty.
    [[nodiscard]] YAML::Mark mark() const;
};

/// The keys of a map in their order. Keys that are no text, and keys given twice, are errors; of
/// two, the first is kept. `what` names the map in messages: "surface 'verge'".
[[nodiscard]] std::vector<Entry> entries_of(const Reading& reading, const Entry& map,
                                            const std::string& what);

/// Whether the value of `entry` is a map or a list, reporting when it is not. `what` says what
/// belongs there, `hint` how to write it.
[[nodiscard]] bool is_map(const Reading& reading, const Entry& entry, const std::string& what,
                          const std::string& hint);
[[nodiscard]] bool is_list(const Reading& reading, const Entry& entry, const std::string& what,
                           const std::string& hint);

/// The text of a single value; `hint` says what to write where there is none, `takes` what else
/// could stand there.
[[nodiscard]] std::optional<std::string> read_text(const Reading& reading, const Entry& entry,
                                                   const std::string& hint,
                                                   const std::string& takes = "a single value");

/// The least value that a number may take.
enum class Least { zero, above_zero };

/// A quantity in its canonical unit, at least `least` and small enough to compute with.
[[nodiscard]] std::optional<double> read_quantity(const Reading& reading, const Entry& entry,
                                                  Dimension dimension, Least least);
/// A number without unit, zero or more and small enough to compute with.
[[nodiscard]] std::optional<double> read_bare(const Reading& reading, const Entry& entry,
                                              const std::string& hint);
/// The same of either sign.
[[nodiscard]] std::optional<double> read_signed(const Reading& reading, const Entry& entry,
                                                const std::string& hint);
/// A number without unit from 0 to 1.
[[nodiscard]] std::optional<double> read_fraction(const Reading& reading, const Entry& entry);
/// One of a few words, as its index.
[[nodiscard]] std::optional<std::size_t> read_word(const Reading& reading, const Entry& entry,
                                                   Words words);

/// The largest magnitude taken, in canonical units: products of a few such values stay finite.
inline constexpr double kLargestValue = 1.0e12;
/// The smallest quantity above zero, likewise: ratios of smaller ones leave the range of numbers.
inline constexpr double kSmallestValue = 1.0e-100;

/// A map whose keys are a closed list. Unknown keys are errors that name what was probably meant.
class ClosedMap {
public:
    /// Nothing, after reporting, where `owner` holds no map.
    [[nodiscard]] static std::optional<ClosedMap> read(const Reading& reading, const Entry& owner,
                                                       std::string what, Words keys,
                                                       const std::string& hint);

    [[nodiscard]] const Entry* find(std::string_view key) const;
    [[nodiscard]] bool has(std::string_view key) const { return find(key) != nullptr; }
    /// Whether an unknown key, already reported, was probably meant to be `key`.
    [[nodiscard]] bool is_misnamed(std::string_view key) const;
    [[nodiscard]] YAML::Mark mark_of(std::string_view key) const { return find(key)->mark(); }
    /// The text of a key that holds a single value, cut short for a message.
    [[nodiscard]] std::string shown(std::string_view key) const;

    /// The entry of a key that must be there; its absence is reported at the map's owner, unless
    /// the key stands there under another name.
    [[nodiscard]] const Entry* require(std::string_view key, std::string_view example) const;

    /// The entry of one of the keys that exclude each other; reports more than one, and with `none`
    /// that there is none.
    [[nodiscard]] const Entry* exactly_one(Words keys, const std::string& none,
                                           const std::string& none_hint,
                                           const std::string& several_hint) const;

    /// Nothing where the key is absent, or wrong and reported.
    [[nodiscard]] std::optional<double> quantity(std::string_view key, Dimension dimension,
                                                 Least least = Least::zero) const;
    [[nodiscard]] std::optional<double> required_quantity(std::string_view key, Dimension dimension,
                                                          Least least = Least::zero) const;
    [[nodiscard]] std::optional<double> fraction(std::string_view key) const;
    [[nodiscard]] std::optional<std::size_t> word(std::string_view key, Words words) const;
    [[nodiscard]] std::optional<std::string> text(std::string_view key,
                                                  const std::string& hint) const;

    /// A warning at a key whose value is above `most` (canonical unit): what is possible, but not
    /// likely.
    void warn_above(std::string_view key, const std::optional<double>& value, double most,
                    const std::string& limit, const std::string& hint) const;

    [[nodiscard]] const Reading& reading() const { return *reading_; }
    [[nodiscard]] const std::string& what() const { return what_; }
    [[nodiscard]] const YAML::Mark& owner_mark() const { return owner_mark_; }

private:
    ClosedMap(const Reading& reading, const Entry& owner, std::string what)
        : reading_(&reading), owner_mark_(owner.key_mark), what_(std::move(what)) {}

    void refuse_key(const Entry& entry, Words keys);

    const Reading* reading_;
    YAML::Mark owner_mark_;
    std::string what_;
    std::vector<Entry> entries_;
    std::vector<std::string> misnamed_;  // the keys probably meant by unknown ones
};

}  // namespace rainledger
