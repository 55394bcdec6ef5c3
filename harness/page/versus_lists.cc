#include "harness/page/versus_lists.h"

#include <algorithm>
#include <cmath>
#include <map>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "harness/page/versus_arcs.h"
#include "harness/report/html_text.h"
#include "harness/report/verdict_text.h"
#include "harness/report/versus_text.h"

namespace gatedyno {
namespace {

double SizeOfChange(const ArcPair& pair) {
  return pair.effort ? std::abs(pair.effort->relative) : 0.0;
}

std::vector<std::size_t> PlacesWhere(const Versus& versus,
                                     bool (*holds)(const ArcPair& pair)) {
  std::vector<std::size_t> places;
  for (std::size_t i = 0; i < versus.arcs.size(); ++i) {
    if (holds(versus.arcs[i])) {
      places.push_back(i);
    }
  }
  std::stable_sort(
      places.begin(), places.end(), [&](std::size_t a, std::size_t b) {
        return SizeOfChange(versus.arcs[a]) > SizeOfChange(versus.arcs[b]);
      });
  return places;
}

// The first kListed of them, and how many are left.
std::string Listed(const Versus& versus,
                   std::vector<std::size_t> places,
                   const std::string& label) {
  const std::size_t all = places.size();
  places.resize(std::min(all, kListed));
  const std::string more =
      all > kListed
          ? fmt::format(
                "<p>The {} with the largest change of g, of {}; all "
                "are in <a href=\"#arcs\">the table of arcs</a>.</p>\n",
                kListed,
                all)
          : "";
  return more + PairList(versus, places, label);
}

bool OtherNode(const VersusView& view) {
  return view.a.result.facts.node != view.b.result.facts.node;
}

// Arcs of a cell at a corner, in words.
using Group = std::map<std::pair<std::string, std::string>, std::string>;

std::string OneSided(const char* side,
                     const std::vector<const Comparison*>& rows) {
  if (rows.empty()) {
    return "";
  }
  Group groups;
  for (const Comparison* row : rows) {
    std::string& arcs = groups[{row->corner, row->arc.cell}];
    arcs += (arcs.empty() ? "" : ", ") + DescribeArc(row->arc);
    if (const std::string with = DescribeSide(row->arc); !with.empty()) {
      arcs += " with " + with;
    }
  }
  std::string items;
  for (const auto& [where, arcs] : groups) {
    items += fmt::format("<li><strong>{}</strong> at {}: {}</li>\n",
                         HtmlName(where.second),
                         HtmlName(where.first),
                         Html(arcs));
  }
  return fmt::format("<h3>Only in {}: {}</h3>\n<ul>\n{}</ul>\n",
                     side,
                     Counted(static_cast<int>(rows.size()), "arc"),
                     items);
}

}  // namespace

std::string ChangedList(const VersusView& view) {
  const std::vector<std::size_t> places = PlacesWhere(
      view.versus, [](const ArcPair& pair) { return pair.changed(); });
  if (places.empty()) {
    return "<p>No arc changed by more than the uncertainty of its "
           "change.</p>\n";
  }
  return (OtherNode(view)
              ? "<p>The uncertainties are those of the fits and of the "
                "simulator, not the differences between two nodes' devices, so "
                "that most arcs are in this list. How far the method's claim "
                "holds is in <a href=\"#spread\">the spread</a>.</p>\n"
              : "") +
         Listed(view.versus, places, "arcs that changed");
}

std::string VerdictList(const VersusView& view) {
  const std::vector<std::size_t> places = PlacesWhere(
      view.versus, [](const ArcPair& pair) { return pair.verdicts_differ(); });
  return places.empty()
             ? "<p>Every arc has the same verdict in both.</p>\n"
             : Listed(view.versus, places, "arcs whose verdicts differ");
}

std::string OneSidedLists(const VersusView& view) {
  const std::string lists =
      OneSided("A", view.versus.only_a) + OneSided("B", view.versus.only_b);
  return lists.empty() ? "<p>Every arc is in both, at the corners "
                         "compared.</p>\n"
                       : lists;
}

}  // namespace gatedyno
