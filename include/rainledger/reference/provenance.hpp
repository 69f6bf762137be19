#pragma once

#include <string>
#include <string_view>

// Where a published number comes from. Every row of every table carries it.
namespace rainledger {

/// How far a number is vouched for.
enum class Status {
    confirmed,        ///< seen in the source, or in a page that reprints it
    from_memory,      ///< recalled from the source, not seen
    common_practice,  ///< a habit of the trade without a source
};

/// "confirmed", "from memory", "common practice".
[[nodiscard]] std::string_view status_words(Status status);

/// A publication. `year` and `edition` are as far as known; `edition` may be empty.
struct Source {
    std::string_view key;  ///< its entry in docs/references.md
    std::string_view author;
    std::string_view title;
    std::string_view year;     ///< "1983", "undated", "year not recorded"
    std::string_view edition;  ///< journal and volume, report number, edition, publisher
};

/// What a number rests on: a source, the place in it, and the status of that number.
struct Provenance {
    const Source* source = nullptr;  ///< never null in a table
    std::string_view place;          ///< table, equation, figure or example
    Status status = Status::from_memory;
    std::string_view remark = {};  ///< what the status does not say; may be empty
};

/// Author, title, year, edition and place, with the status in brackets, for people: "Bouwer: Rapid
/// field measurement ..., 1966, Water Resources Research 2(4), page 730 (from memory)".
[[nodiscard]] std::string citation(const Provenance& provenance);

}  // namespace rainledger
