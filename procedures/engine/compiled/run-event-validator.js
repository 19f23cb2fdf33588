'use strict';
// Made by build-validators.mjs from the schema; not to be edited.

exports.checkRunEvent = validate52;
const schema19 = {"$schema":"https://json-schema.org/draft/2020-12/schema","$id":"run-event.schema.json","title":"Run event","description":"One thing that happened in a run: the envelope, and the data of its type. Agrees with run-event.ts.","type":"object","properties":{"runId":{"$ref":"#/$defs/anyUuid"},"seq":{"$ref":"#/$defs/seq"},"id":{"$ref":"#/$defs/uuid"},"at":{"$ref":"#/$defs/count"},"elapsed":{"type":"number","minimum":0,"maximum":9007199254740991},"actor":{"$ref":"#/$defs/id"},"device":{"$ref":"#/$defs/id"},"build":{"$ref":"#/$defs/id"},"schema":{"const":1},"prev":{"$ref":"#/$defs/hash"},"hash":{"$ref":"#/$defs/hash"},"type":{"enum":["opened","gear-chosen","step-claimed","step-done","caution-acknowledged","reading-recorded","not-measurable","not-applicable","predicted","series-recorded","mark-placed","codes-recorded","timer-started","timer-ended","choice-made","photo-attached","note-written","margin-note-written","disturbed","restored","branch-taken","branch-overruled","step-redone","undone","lead-called","released","set-aside","resumed","handed-over","limit-exceeded","alert-raised","alert-acknowledged","stopped","version-notice-answered","finding-reached","write-up-written","closed","verified","signed","amended","joined","clock-jumped","transcribed"]},"data":{"type":"object"}},"required":["runId","seq","id","at","elapsed","actor","device","build","schema","prev","hash","type","data"],"allOf":[{"if":{"properties":{"type":{"const":"opened"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/opened"}}}},{"if":{"properties":{"type":{"const":"gear-chosen"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/gear-chosen"}}}},{"if":{"properties":{"type":{"const":"step-claimed"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/step-claimed"}}}},{"if":{"properties":{"type":{"const":"step-done"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/step-done"}}}},{"if":{"properties":{"type":{"const":"caution-acknowledged"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/caution-acknowledged"}}}},{"if":{"properties":{"type":{"const":"reading-recorded"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/reading-recorded"}}}},{"if":{"properties":{"type":{"const":"not-measurable"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/not-measurable"}}}},{"if":{"properties":{"type":{"const":"not-applicable"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/not-applicable"}}}},{"if":{"properties":{"type":{"const":"predicted"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/predicted"}}}},{"if":{"properties":{"type":{"const":"series-recorded"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/series-recorded"}}}},{"if":{"properties":{"type":{"const":"mark-placed"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/mark-placed"}}}},{"if":{"properties":{"type":{"const":"codes-recorded"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/codes-recorded"}}}},{"if":{"properties":{"type":{"const":"timer-started"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/timer-started"}}}},{"if":{"properties":{"type":{"const":"timer-ended"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/timer-ended"}}}},{"if":{"properties":{"type":{"const":"choice-made"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/choice-made"}}}},{"if":{"properties":{"type":{"const":"photo-attached"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/photo-attached"}}}},{"if":{"properties":{"type":{"const":"note-written"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/note-written"}}}},{"if":{"properties":{"type":{"const":"margin-note-written"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/margin-note-written"}}}},{"if":{"properties":{"type":{"const":"disturbed"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/disturbed"}}}},{"if":{"properties":{"type":{"const":"restored"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/restored"}}}},{"if":{"properties":{"type":{"const":"branch-taken"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/branch-taken"}}}},{"if":{"properties":{"type":{"const":"branch-overruled"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/branch-overruled"}}}},{"if":{"properties":{"type":{"const":"step-redone"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/step-redone"}}}},{"if":{"properties":{"type":{"const":"undone"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/undone"}}}},{"if":{"properties":{"type":{"const":"lead-called"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/lead-called"}}}},{"if":{"properties":{"type":{"const":"released"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/released"}}}},{"if":{"properties":{"type":{"const":"set-aside"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/set-aside"}}}},{"if":{"properties":{"type":{"const":"resumed"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/resumed"}}}},{"if":{"properties":{"type":{"const":"handed-over"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/handed-over"}}}},{"if":{"properties":{"type":{"const":"limit-exceeded"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/limit-exceeded"}}}},{"if":{"properties":{"type":{"const":"alert-raised"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/alert-raised"}}}},{"if":{"properties":{"type":{"const":"alert-acknowledged"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/alert-acknowledged"}}}},{"if":{"properties":{"type":{"const":"stopped"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/stopped"}}}},{"if":{"properties":{"type":{"const":"version-notice-answered"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/version-notice-answered"}}}},{"if":{"properties":{"type":{"const":"finding-reached"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/finding-reached"}}}},{"if":{"properties":{"type":{"const":"write-up-written"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/write-up-written"}}}},{"if":{"properties":{"type":{"const":"closed"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/closed"}}}},{"if":{"properties":{"type":{"const":"verified"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/verified"}}}},{"if":{"properties":{"type":{"const":"signed"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/signed"}}}},{"if":{"properties":{"type":{"const":"amended"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/amended"}}}},{"if":{"properties":{"type":{"const":"joined"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/joined"}}}},{"if":{"properties":{"type":{"const":"clock-jumped"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/clock-jumped"}}}},{"if":{"properties":{"type":{"const":"transcribed"}},"required":["type"]},"then":{"properties":{"data":{"$ref":"#/$defs/transcribed"}}}}],"additionalProperties":false,"$defs":{"unit":{"enum":["kPa","Pa","hPa","bar","psi","inHg","inH2O","mmHg","degC","degF","K","L/min","ft3/min","m3/s","g/s","kg/h","lb/min","L","cm3","mm","m","km","mi","Nm","lbf.ft","V","mV","ohm","kohm","s","min","h","km/h","mph","%","1","rpm","dB"]},"sense":{"enum":["absolute","gauge"]},"id":{"description":"An id or a name of the document.","type":"string","minLength":1,"maxLength":100},"step":{"type":"string","pattern":"^[A-Za-z][A-Za-z0-9-]*$","maxLength":60},"hash":{"description":"SHA-256, hexadecimal.","type":"string","pattern":"^[0-9a-f]{64}$"},"label":{"type":"string","maxLength":200},"words":{"type":"string","maxLength":4000},"figureText":{"description":"A figure with the digits that were given.","type":"string","minLength":1,"maxLength":40},"seq":{"type":"integer","minimum":1,"maximum":9007199254740991},"count":{"type":"integer","minimum":0,"maximum":9007199254740991},"source":{"enum":["typed","file","simulated","computed"]},"figure":{"type":"object","properties":{"text":{"$ref":"#/$defs/figureText"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"}},"required":["text","unit"],"additionalProperties":false},"inputFigure":{"type":"object","properties":{"text":{"$ref":"#/$defs/figureText"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"source":{"$ref":"#/$defs/label"}},"required":["text","unit","source"],"additionalProperties":false},"instrumentRange":{"type":"object","properties":{"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"low":{"type":"number"},"high":{"type":"number"},"resolution":{"type":"number","minimum":0},"accuracy":{"type":"number","minimum":0}},"required":["unit","low","high","resolution","accuracy"],"additionalProperties":false},"instrument":{"type":"object","properties":{"id":{"$ref":"#/$defs/id"},"kind":{"enum":["pressure-gauge","scan-tool","listening-probe","barometer","thermometer"]},"label":{"$ref":"#/$defs/label"},"shows":{"type":"array","items":{"$ref":"#/$defs/instrumentRange"},"maxItems":20},"dueOn":{"type":"string","pattern":"^[0-9]{4}-[0-9]{2}-[0-9]{2}$"}},"required":["id","kind","label","shows","dueOn"],"additionalProperties":false},"visit":{"type":"object","properties":{"repairOrder":{"$ref":"#/$defs/label"},"vin":{"type":"string","maxLength":40},"car":{"$ref":"#/$defs/label"},"odometer":{"$ref":"#/$defs/figure"},"concern":{"$ref":"#/$defs/words"},"codes":{"type":"array","items":{"type":"string","maxLength":20},"maxItems":100}},"required":["repairOrder","vin","car","odometer","concern","codes"],"additionalProperties":false},"code":{"type":"object","properties":{"code":{"type":"string","minLength":1,"maxLength":20},"status":{"enum":["stored","pending","permanent"]},"freezeFrame":{"$ref":"#/$defs/words"}},"required":["code","status"],"additionalProperties":false},"decisionInput":{"type":"object","properties":{"name":{"$ref":"#/$defs/id"},"label":{"$ref":"#/$defs/label"},"text":{"type":"string","maxLength":200},"unit":{"$ref":"#/$defs/unit"},"uncertainty":{"$ref":"#/$defs/figureText"}},"required":["name","label","text"],"additionalProperties":false},"report":{"type":"string","maxLength":40000},"opened":{"type":"object","properties":{"visit":{"$ref":"#/$defs/visit"},"siteName":{"$ref":"#/$defs/label"},"inputs":{"type":"object","propertyNames":{"type":"string","pattern":"^[a-z][A-Za-z0-9]*$","maxLength":60},"maxProperties":200,"additionalProperties":{"$ref":"#/$defs/inputFigure"}},"person":{"$ref":"#/$defs/label"},"again":{"$ref":"#/$defs/begunAgain"}},"required":["visit","siteName","inputs","person"],"additionalProperties":false},"begunAgain":{"description":"Why a run was begun although others of the same half were known.","type":"object","properties":{"because":{"$ref":"#/$defs/words"},"besides":{"type":"array","items":{"$ref":"#/$defs/anyUuid"},"maxItems":200}},"required":["because","besides"],"additionalProperties":false},"gear-chosen":{"type":"object","properties":{"role":{"$ref":"#/$defs/id"},"instrument":{"$ref":"#/$defs/instrument"},"overdueBecause":{"$ref":"#/$defs/words"}},"required":["role","instrument"],"additionalProperties":false},"step-claimed":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"}},"required":["step"],"additionalProperties":false},"step-done":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"}},"required":["step"],"additionalProperties":false},"caution-acknowledged":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"caution":{"type":"integer","minimum":0,"maximum":1000}},"required":["step","caution"],"additionalProperties":false},"reading-recorded":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"name":{"$ref":"#/$defs/id"},"figure":{"$ref":"#/$defs/figure"},"source":{"$ref":"#/$defs/source"},"way":{"$ref":"#/$defs/id"},"instrument":{"$ref":"#/$defs/id"},"resolution":{"$ref":"#/$defs/figureText"},"uncertainty":{"$ref":"#/$defs/figureText"},"timeS":{"type":"number","minimum":0}},"required":["step","name","figure","source"],"additionalProperties":false},"not-measurable":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"reason":{"$ref":"#/$defs/words"}},"required":["step","reason"],"additionalProperties":false},"not-applicable":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"reason":{"$ref":"#/$defs/words"}},"required":["step","reason"],"additionalProperties":false},"predicted":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"option":{"$ref":"#/$defs/id"}},"required":["step","option"],"additionalProperties":false},"series-recorded":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"name":{"$ref":"#/$defs/id"},"sha256":{"$ref":"#/$defs/hash"},"bytes":{"$ref":"#/$defs/count"},"samples":{"$ref":"#/$defs/count"},"durationS":{"type":"number","minimum":0},"channels":{"type":"array","items":{"type":"object","properties":{"name":{"$ref":"#/$defs/label"},"unit":{"type":"string","maxLength":40},"column":{"$ref":"#/$defs/label"}},"required":["name","unit","column"],"additionalProperties":false},"maxItems":200},"source":{"$ref":"#/$defs/source"},"fileName":{"type":"string","maxLength":400},"skipped":{"$ref":"#/$defs/count"},"problems":{"type":"array","items":{"$ref":"#/$defs/words"},"maxItems":100}},"required":["step","name","sha256","bytes","samples","durationS","channels","source","skipped","problems"],"additionalProperties":false},"mark-placed":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"series":{"$ref":"#/$defs/id"},"mark":{"enum":["noise-begins","noise-stops"]},"timeS":{"type":"number","minimum":0},"by":{"enum":["tap","pedal","suggested"]}},"required":["step","series","mark","timeS","by"],"additionalProperties":false},"codes-recorded":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"name":{"$ref":"#/$defs/id"},"codes":{"type":"array","items":{"$ref":"#/$defs/code"},"maxItems":200}},"required":["step","name","codes"],"additionalProperties":false},"timer-started":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"seconds":{"type":"number","minimum":0}},"required":["step","seconds"],"additionalProperties":false},"timer-ended":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"certain":{"type":"boolean"}},"required":["step","certain"],"additionalProperties":false},"choice-made":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"name":{"$ref":"#/$defs/id"},"options":{"type":"array","items":{"$ref":"#/$defs/id"},"maxItems":50},"text":{"$ref":"#/$defs/words"}},"required":["step","name","options"],"additionalProperties":false},"photo-attached":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"sha256":{"$ref":"#/$defs/hash"},"bytes":{"$ref":"#/$defs/count"},"mediaType":{"type":"string","maxLength":100}},"required":["step","sha256","bytes","mediaType"],"additionalProperties":false},"note-written":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"text":{"$ref":"#/$defs/words"}},"required":["step","text"],"additionalProperties":false},"margin-note-written":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"text":{"$ref":"#/$defs/words"}},"required":["step","text"],"additionalProperties":false},"disturbed":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"item":{"$ref":"#/$defs/id"},"label":{"$ref":"#/$defs/label"}},"required":["step","item","label"],"additionalProperties":false},"restored":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"item":{"$ref":"#/$defs/id"}},"required":["step","item"],"additionalProperties":false},"branch-taken":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"to":{"$ref":"#/$defs/step"},"exit":{"type":"string","minLength":1,"maxLength":60},"when":{"type":"string","maxLength":2000},"inputs":{"type":"array","items":{"$ref":"#/$defs/decisionInput"},"maxItems":400},"because":{"$ref":"#/$defs/words"},"verdict":{"$ref":"#/$defs/step"},"reason":{"$ref":"#/$defs/words"}},"required":["step","to","exit","inputs","because"],"additionalProperties":false},"branch-overruled":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"computed":{"$ref":"#/$defs/id"},"chosen":{"$ref":"#/$defs/id"},"reason":{"$ref":"#/$defs/words"}},"required":["step","computed","chosen","reason"],"additionalProperties":false},"step-redone":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"reason":{"$ref":"#/$defs/words"}},"required":["step","reason"],"additionalProperties":false},"undone":{"type":"object","properties":{"seq":{"$ref":"#/$defs/seq"},"reason":{"$ref":"#/$defs/words"}},"required":["seq","reason"],"additionalProperties":false},"lead-called":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"question":{"$ref":"#/$defs/words"}},"required":["step","question"],"additionalProperties":false},"released":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"evidence":{"$ref":"#/$defs/words"},"by":{"enum":["lead","manager"]}},"required":["step","evidence","by"],"additionalProperties":false},"set-aside":{"type":"object","properties":{"reason":{"$ref":"#/$defs/words"}},"required":["reason"],"additionalProperties":false},"resumed":{"type":"object","properties":{"from":{"enum":["set-aside","stopped","reload","lead-called"]},"reason":{"$ref":"#/$defs/words"}},"required":["from"],"additionalProperties":false},"handed-over":{"type":"object","properties":{"to":{"$ref":"#/$defs/id"},"reason":{"$ref":"#/$defs/words"}},"required":["to","reason"],"additionalProperties":false},"limit-exceeded":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"limit":{"$ref":"#/$defs/id"},"name":{"$ref":"#/$defs/id"},"figure":{"$ref":"#/$defs/figure"}},"required":["step","limit","name","figure"],"additionalProperties":false},"alert-raised":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"text":{"$ref":"#/$defs/words"}},"required":["step","text"],"additionalProperties":false},"alert-acknowledged":{"type":"object","properties":{"seq":{"$ref":"#/$defs/seq"}},"required":["seq"],"additionalProperties":false},"stopped":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"reason":{"$ref":"#/$defs/words"}},"required":["step","reason"],"additionalProperties":false},"version-notice-answered":{"type":"object","properties":{"version":{"$ref":"#/$defs/seq"},"answer":{"enum":["go-on","end"]}},"required":["version","answer"],"additionalProperties":false},"finding-reached":{"type":"object","properties":{"finding":{"$ref":"#/$defs/step"},"verdict":{"$ref":"#/$defs/words"}},"required":["finding","verdict"],"additionalProperties":false},"write-up-written":{"type":"object","properties":{"concern":{"$ref":"#/$defs/report"},"cause":{"$ref":"#/$defs/report"},"correction":{"$ref":"#/$defs/report"},"customer":{"$ref":"#/$defs/report"},"edited":{"type":"array","items":{"enum":["concern","cause","correction","customer"]},"maxItems":4}},"required":["concern","cause","correction","customer","edited"],"additionalProperties":false},"closed":{"type":"object","properties":{"finding":{"$ref":"#/$defs/step"}},"required":["finding"],"additionalProperties":false},"verified":{"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"by":{"$ref":"#/$defs/id"}},"required":["step","by"],"additionalProperties":false},"signed":{"type":"object","properties":{"head":{"$ref":"#/$defs/hash"},"meaning":{"enum":["performed","reviewed"]},"signature":{"type":"string","minLength":1,"maxLength":1000},"key":{"type":"string","minLength":1,"maxLength":1000}},"required":["head","meaning","signature","key"],"additionalProperties":false},"amended":{"type":"object","properties":{"text":{"$ref":"#/$defs/words"},"reason":{"$ref":"#/$defs/words"}},"required":["text","reason"],"additionalProperties":false},"joined":{"type":"object","properties":{"branch":{"$ref":"#/$defs/id"},"head":{"$ref":"#/$defs/hash"}},"required":["branch","head"],"additionalProperties":false},"clock-jumped":{"type":"object","properties":{"byMs":{"type":"number"}},"required":["byMs"],"additionalProperties":false},"transcribed":{"type":"object","properties":{"from":{"$ref":"#/$defs/words"}},"required":["from"],"additionalProperties":false},"anyUuid":{"type":"string","pattern":"^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$"},"uuid":{"type":"string","pattern":"^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$"}}};
const schema20 = {"type":"object","properties":{"visit":{"$ref":"#/$defs/visit"},"siteName":{"$ref":"#/$defs/label"},"inputs":{"type":"object","propertyNames":{"type":"string","pattern":"^[a-z][A-Za-z0-9]*$","maxLength":60},"maxProperties":200,"additionalProperties":{"$ref":"#/$defs/inputFigure"}},"person":{"$ref":"#/$defs/label"},"again":{"$ref":"#/$defs/begunAgain"}},"required":["visit","siteName","inputs","person"],"additionalProperties":false};
const schema21 = {"type":"object","properties":{"repairOrder":{"$ref":"#/$defs/label"},"vin":{"type":"string","maxLength":40},"car":{"$ref":"#/$defs/label"},"odometer":{"$ref":"#/$defs/figure"},"concern":{"$ref":"#/$defs/words"},"codes":{"type":"array","items":{"type":"string","maxLength":20},"maxItems":100}},"required":["repairOrder","vin","car","odometer","concern","codes"],"additionalProperties":false};
const schema22 = {"type":"string","maxLength":200};
const func1 = (text) => [...text].length;

function validate55(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate55.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(func1(data) > 200){
const err0 = {instancePath,schemaPath:"#/maxLength",keyword:"maxLength",params:{limit: 200},message:"must NOT have more than 200 characters"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
}
else {
const err1 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
validate55.errors = vErrors;
return errors === 0;
}
validate55.evaluated = {"dynamicProps":false,"dynamicItems":false};

const schema23 = {"type":"object","properties":{"text":{"$ref":"#/$defs/figureText"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"}},"required":["text","unit"],"additionalProperties":false};
const schema24 = {"description":"A figure with the digits that were given.","type":"string","minLength":1,"maxLength":40};

function validate59(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate59.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(func1(data) > 40){
const err0 = {instancePath,schemaPath:"#/maxLength",keyword:"maxLength",params:{limit: 40},message:"must NOT have more than 40 characters"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(func1(data) < 1){
const err1 = {instancePath,schemaPath:"#/minLength",keyword:"minLength",params:{limit: 1},message:"must NOT have fewer than 1 characters"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate59.errors = vErrors;
return errors === 0;
}
validate59.evaluated = {"dynamicProps":false,"dynamicItems":false};

const schema25 = {"enum":["kPa","Pa","hPa","bar","psi","inHg","inH2O","mmHg","degC","degF","K","L/min","ft3/min","m3/s","g/s","kg/h","lb/min","L","cm3","mm","m","km","mi","Nm","lbf.ft","V","mV","ohm","kohm","s","min","h","km/h","mph","%","1","rpm","dB"]};

function validate61(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate61.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(!((((((((((((((((((((((((((((((((((((((data === "kPa") || (data === "Pa")) || (data === "hPa")) || (data === "bar")) || (data === "psi")) || (data === "inHg")) || (data === "inH2O")) || (data === "mmHg")) || (data === "degC")) || (data === "degF")) || (data === "K")) || (data === "L/min")) || (data === "ft3/min")) || (data === "m3/s")) || (data === "g/s")) || (data === "kg/h")) || (data === "lb/min")) || (data === "L")) || (data === "cm3")) || (data === "mm")) || (data === "m")) || (data === "km")) || (data === "mi")) || (data === "Nm")) || (data === "lbf.ft")) || (data === "V")) || (data === "mV")) || (data === "ohm")) || (data === "kohm")) || (data === "s")) || (data === "min")) || (data === "h")) || (data === "km/h")) || (data === "mph")) || (data === "%")) || (data === "1")) || (data === "rpm")) || (data === "dB"))){
const err0 = {instancePath,schemaPath:"#/enum",keyword:"enum",params:{allowedValues: schema25.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
validate61.errors = vErrors;
return errors === 0;
}
validate61.evaluated = {"dynamicProps":false,"dynamicItems":false};

const schema26 = {"enum":["absolute","gauge"]};

function validate63(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate63.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(!((data === "absolute") || (data === "gauge"))){
const err0 = {instancePath,schemaPath:"#/enum",keyword:"enum",params:{allowedValues: schema26.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
validate63.errors = vErrors;
return errors === 0;
}
validate63.evaluated = {"dynamicProps":false,"dynamicItems":false};


function validate58(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate58.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.text === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "text"},message:"must have required property '"+"text"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.unit === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "unit"},message:"must have required property '"+"unit"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!(((key0 === "text") || (key0 === "unit")) || (key0 === "sense"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.text !== undefined){
if(!(validate59(data.text, {instancePath:instancePath+"/text",parentData:data,parentDataProperty:"text",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate59.errors : vErrors.concat(validate59.errors);
errors = vErrors.length;
}
}
if(data.unit !== undefined){
if(!(validate61(data.unit, {instancePath:instancePath+"/unit",parentData:data,parentDataProperty:"unit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.sense !== undefined){
if(!(validate63(data.sense, {instancePath:instancePath+"/sense",parentData:data,parentDataProperty:"sense",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate63.errors : vErrors.concat(validate63.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate58.errors = vErrors;
return errors === 0;
}
validate58.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema27 = {"type":"string","maxLength":4000};

function validate66(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate66.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(func1(data) > 4000){
const err0 = {instancePath,schemaPath:"#/maxLength",keyword:"maxLength",params:{limit: 4000},message:"must NOT have more than 4000 characters"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
}
else {
const err1 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
validate66.errors = vErrors;
return errors === 0;
}
validate66.evaluated = {"dynamicProps":false,"dynamicItems":false};


function validate54(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate54.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.repairOrder === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "repairOrder"},message:"must have required property '"+"repairOrder"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.vin === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "vin"},message:"must have required property '"+"vin"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.car === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "car"},message:"must have required property '"+"car"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.odometer === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "odometer"},message:"must have required property '"+"odometer"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.concern === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "concern"},message:"must have required property '"+"concern"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.codes === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "codes"},message:"must have required property '"+"codes"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
for(const key0 in data){
if(!((((((key0 === "repairOrder") || (key0 === "vin")) || (key0 === "car")) || (key0 === "odometer")) || (key0 === "concern")) || (key0 === "codes"))){
const err6 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
if(data.repairOrder !== undefined){
if(!(validate55(data.repairOrder, {instancePath:instancePath+"/repairOrder",parentData:data,parentDataProperty:"repairOrder",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.vin !== undefined){
let data1 = data.vin;
if(typeof data1 === "string"){
if(func1(data1) > 40){
const err7 = {instancePath:instancePath+"/vin",schemaPath:"#/properties/vin/maxLength",keyword:"maxLength",params:{limit: 40},message:"must NOT have more than 40 characters"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
else {
const err8 = {instancePath:instancePath+"/vin",schemaPath:"#/properties/vin/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
}
if(data.car !== undefined){
if(!(validate55(data.car, {instancePath:instancePath+"/car",parentData:data,parentDataProperty:"car",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.odometer !== undefined){
if(!(validate58(data.odometer, {instancePath:instancePath+"/odometer",parentData:data,parentDataProperty:"odometer",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate58.errors : vErrors.concat(validate58.errors);
errors = vErrors.length;
}
}
if(data.concern !== undefined){
if(!(validate66(data.concern, {instancePath:instancePath+"/concern",parentData:data,parentDataProperty:"concern",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.codes !== undefined){
let data5 = data.codes;
if(Array.isArray(data5)){
if(data5.length > 100){
const err9 = {instancePath:instancePath+"/codes",schemaPath:"#/properties/codes/maxItems",keyword:"maxItems",params:{limit: 100},message:"must NOT have more than 100 items"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
const len0 = data5.length;
for(let i0=0; i0<len0; i0++){
let data6 = data5[i0];
if(typeof data6 === "string"){
if(func1(data6) > 20){
const err10 = {instancePath:instancePath+"/codes/" + i0,schemaPath:"#/properties/codes/items/maxLength",keyword:"maxLength",params:{limit: 20},message:"must NOT have more than 20 characters"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
else {
const err11 = {instancePath:instancePath+"/codes/" + i0,schemaPath:"#/properties/codes/items/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
}
else {
const err12 = {instancePath:instancePath+"/codes",schemaPath:"#/properties/codes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
}
}
else {
const err13 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
validate54.errors = vErrors;
return errors === 0;
}
validate54.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema28 = {"type":"object","properties":{"text":{"$ref":"#/$defs/figureText"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"source":{"$ref":"#/$defs/label"}},"required":["text","unit","source"],"additionalProperties":false};

function validate70(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate70.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.text === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "text"},message:"must have required property '"+"text"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.unit === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "unit"},message:"must have required property '"+"unit"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.source === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "source"},message:"must have required property '"+"source"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
for(const key0 in data){
if(!((((key0 === "text") || (key0 === "unit")) || (key0 === "sense")) || (key0 === "source"))){
const err3 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.text !== undefined){
if(!(validate59(data.text, {instancePath:instancePath+"/text",parentData:data,parentDataProperty:"text",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate59.errors : vErrors.concat(validate59.errors);
errors = vErrors.length;
}
}
if(data.unit !== undefined){
if(!(validate61(data.unit, {instancePath:instancePath+"/unit",parentData:data,parentDataProperty:"unit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.sense !== undefined){
if(!(validate63(data.sense, {instancePath:instancePath+"/sense",parentData:data,parentDataProperty:"sense",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate63.errors : vErrors.concat(validate63.errors);
errors = vErrors.length;
}
}
if(data.source !== undefined){
if(!(validate55(data.source, {instancePath:instancePath+"/source",parentData:data,parentDataProperty:"source",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
}
else {
const err4 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
validate70.errors = vErrors;
return errors === 0;
}
validate70.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema29 = {"description":"Why a run was begun although others of the same half were known.","type":"object","properties":{"because":{"$ref":"#/$defs/words"},"besides":{"type":"array","items":{"$ref":"#/$defs/anyUuid"},"maxItems":200}},"required":["because","besides"],"additionalProperties":false};
const schema30 = {"type":"string","pattern":"^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$"};
const pattern4 = new RegExp("^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$", "u");

function validate79(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate79.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(!pattern4.test(data)){
const err0 = {instancePath,schemaPath:"#/pattern",keyword:"pattern",params:{pattern: "^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$"},message:"must match pattern \""+"^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$"+"\""};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
}
else {
const err1 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
validate79.errors = vErrors;
return errors === 0;
}
validate79.evaluated = {"dynamicProps":false,"dynamicItems":false};


function validate77(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate77.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.because === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "because"},message:"must have required property '"+"because"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.besides === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "besides"},message:"must have required property '"+"besides"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "because") || (key0 === "besides"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.because !== undefined){
if(!(validate66(data.because, {instancePath:instancePath+"/because",parentData:data,parentDataProperty:"because",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.besides !== undefined){
let data1 = data.besides;
if(Array.isArray(data1)){
if(data1.length > 200){
const err3 = {instancePath:instancePath+"/besides",schemaPath:"#/properties/besides/maxItems",keyword:"maxItems",params:{limit: 200},message:"must NOT have more than 200 items"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
const len0 = data1.length;
for(let i0=0; i0<len0; i0++){
if(!(validate79(data1[i0], {instancePath:instancePath+"/besides/" + i0,parentData:data1,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate79.errors : vErrors.concat(validate79.errors);
errors = vErrors.length;
}
}
}
else {
const err4 = {instancePath:instancePath+"/besides",schemaPath:"#/properties/besides/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
}
else {
const err5 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
validate77.errors = vErrors;
return errors === 0;
}
validate77.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const pattern3 = new RegExp("^[a-z][A-Za-z0-9]*$", "u");

function validate53(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate53.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.visit === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "visit"},message:"must have required property '"+"visit"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.siteName === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "siteName"},message:"must have required property '"+"siteName"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.inputs === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "inputs"},message:"must have required property '"+"inputs"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.person === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "person"},message:"must have required property '"+"person"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!(((((key0 === "visit") || (key0 === "siteName")) || (key0 === "inputs")) || (key0 === "person")) || (key0 === "again"))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.visit !== undefined){
if(!(validate54(data.visit, {instancePath:instancePath+"/visit",parentData:data,parentDataProperty:"visit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate54.errors : vErrors.concat(validate54.errors);
errors = vErrors.length;
}
}
if(data.siteName !== undefined){
if(!(validate55(data.siteName, {instancePath:instancePath+"/siteName",parentData:data,parentDataProperty:"siteName",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.inputs !== undefined){
let data2 = data.inputs;
if(data2 && typeof data2 == "object" && !Array.isArray(data2)){
if(Object.keys(data2).length > 200){
const err5 = {instancePath:instancePath+"/inputs",schemaPath:"#/properties/inputs/maxProperties",keyword:"maxProperties",params:{limit: 200},message:"must NOT have more than 200 properties"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
for(const key1 in data2){
const _errs6 = errors;
if(typeof key1 === "string"){
if(func1(key1) > 60){
const err6 = {instancePath:instancePath+"/inputs",schemaPath:"#/properties/inputs/propertyNames/maxLength",keyword:"maxLength",params:{limit: 60},message:"must NOT have more than 60 characters",propertyName:key1};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(!pattern3.test(key1)){
const err7 = {instancePath:instancePath+"/inputs",schemaPath:"#/properties/inputs/propertyNames/pattern",keyword:"pattern",params:{pattern: "^[a-z][A-Za-z0-9]*$"},message:"must match pattern \""+"^[a-z][A-Za-z0-9]*$"+"\"",propertyName:key1};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
else {
const err8 = {instancePath:instancePath+"/inputs",schemaPath:"#/properties/inputs/propertyNames/type",keyword:"type",params:{type: "string"},message:"must be string",propertyName:key1};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
var valid1 = _errs6 === errors;
if(!valid1){
const err9 = {instancePath:instancePath+"/inputs",schemaPath:"#/properties/inputs/propertyNames",keyword:"propertyNames",params:{propertyName: key1},message:"property name must be valid"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
for(const key2 in data2){
if(!(validate70(data2[key2], {instancePath:instancePath+"/inputs/" + key2.replace(/~/g, "~0").replace(/\//g, "~1"),parentData:data2,parentDataProperty:key2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate70.errors : vErrors.concat(validate70.errors);
errors = vErrors.length;
}
}
}
else {
const err10 = {instancePath:instancePath+"/inputs",schemaPath:"#/properties/inputs/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.person !== undefined){
if(!(validate55(data.person, {instancePath:instancePath+"/person",parentData:data,parentDataProperty:"person",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.again !== undefined){
if(!(validate77(data.again, {instancePath:instancePath+"/again",parentData:data,parentDataProperty:"again",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate77.errors : vErrors.concat(validate77.errors);
errors = vErrors.length;
}
}
}
else {
const err11 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
validate53.errors = vErrors;
return errors === 0;
}
validate53.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema31 = {"type":"object","properties":{"role":{"$ref":"#/$defs/id"},"instrument":{"$ref":"#/$defs/instrument"},"overdueBecause":{"$ref":"#/$defs/words"}},"required":["role","instrument"],"additionalProperties":false};
const schema32 = {"description":"An id or a name of the document.","type":"string","minLength":1,"maxLength":100};

function validate84(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate84.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(func1(data) > 100){
const err0 = {instancePath,schemaPath:"#/maxLength",keyword:"maxLength",params:{limit: 100},message:"must NOT have more than 100 characters"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(func1(data) < 1){
const err1 = {instancePath,schemaPath:"#/minLength",keyword:"minLength",params:{limit: 1},message:"must NOT have fewer than 1 characters"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate84.errors = vErrors;
return errors === 0;
}
validate84.evaluated = {"dynamicProps":false,"dynamicItems":false};

const schema33 = {"type":"object","properties":{"id":{"$ref":"#/$defs/id"},"kind":{"enum":["pressure-gauge","scan-tool","listening-probe","barometer","thermometer"]},"label":{"$ref":"#/$defs/label"},"shows":{"type":"array","items":{"$ref":"#/$defs/instrumentRange"},"maxItems":20},"dueOn":{"type":"string","pattern":"^[0-9]{4}-[0-9]{2}-[0-9]{2}$"}},"required":["id","kind","label","shows","dueOn"],"additionalProperties":false};
const schema34 = {"type":"object","properties":{"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"low":{"type":"number"},"high":{"type":"number"},"resolution":{"type":"number","minimum":0},"accuracy":{"type":"number","minimum":0}},"required":["unit","low","high","resolution","accuracy"],"additionalProperties":false};

function validate89(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate89.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.unit === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "unit"},message:"must have required property '"+"unit"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.low === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "low"},message:"must have required property '"+"low"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.high === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "high"},message:"must have required property '"+"high"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.resolution === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "resolution"},message:"must have required property '"+"resolution"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.accuracy === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "accuracy"},message:"must have required property '"+"accuracy"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
for(const key0 in data){
if(!((((((key0 === "unit") || (key0 === "sense")) || (key0 === "low")) || (key0 === "high")) || (key0 === "resolution")) || (key0 === "accuracy"))){
const err5 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.unit !== undefined){
if(!(validate61(data.unit, {instancePath:instancePath+"/unit",parentData:data,parentDataProperty:"unit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.sense !== undefined){
if(!(validate63(data.sense, {instancePath:instancePath+"/sense",parentData:data,parentDataProperty:"sense",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate63.errors : vErrors.concat(validate63.errors);
errors = vErrors.length;
}
}
if(data.low !== undefined){
let data2 = data.low;
if(!((typeof data2 == "number") && (isFinite(data2)))){
const err6 = {instancePath:instancePath+"/low",schemaPath:"#/properties/low/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
if(data.high !== undefined){
let data3 = data.high;
if(!((typeof data3 == "number") && (isFinite(data3)))){
const err7 = {instancePath:instancePath+"/high",schemaPath:"#/properties/high/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
if(data.resolution !== undefined){
let data4 = data.resolution;
if((typeof data4 == "number") && (isFinite(data4))){
if(data4 < 0 || isNaN(data4)){
const err8 = {instancePath:instancePath+"/resolution",schemaPath:"#/properties/resolution/minimum",keyword:"minimum",params:{comparison: ">=", limit: 0},message:"must be >= 0"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
}
else {
const err9 = {instancePath:instancePath+"/resolution",schemaPath:"#/properties/resolution/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
if(data.accuracy !== undefined){
let data5 = data.accuracy;
if((typeof data5 == "number") && (isFinite(data5))){
if(data5 < 0 || isNaN(data5)){
const err10 = {instancePath:instancePath+"/accuracy",schemaPath:"#/properties/accuracy/minimum",keyword:"minimum",params:{comparison: ">=", limit: 0},message:"must be >= 0"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
else {
const err11 = {instancePath:instancePath+"/accuracy",schemaPath:"#/properties/accuracy/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
}
else {
const err12 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
validate89.errors = vErrors;
return errors === 0;
}
validate89.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const pattern5 = new RegExp("^[0-9]{4}-[0-9]{2}-[0-9]{2}$", "u");

function validate86(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate86.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.kind === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.label === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.shows === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "shows"},message:"must have required property '"+"shows"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.dueOn === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "dueOn"},message:"must have required property '"+"dueOn"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
for(const key0 in data){
if(!(((((key0 === "id") || (key0 === "kind")) || (key0 === "label")) || (key0 === "shows")) || (key0 === "dueOn"))){
const err5 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.kind !== undefined){
let data1 = data.kind;
if(!(((((data1 === "pressure-gauge") || (data1 === "scan-tool")) || (data1 === "listening-probe")) || (data1 === "barometer")) || (data1 === "thermometer"))){
const err6 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/enum",keyword:"enum",params:{allowedValues: schema33.properties.kind.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.shows !== undefined){
let data3 = data.shows;
if(Array.isArray(data3)){
if(data3.length > 20){
const err7 = {instancePath:instancePath+"/shows",schemaPath:"#/properties/shows/maxItems",keyword:"maxItems",params:{limit: 20},message:"must NOT have more than 20 items"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
const len0 = data3.length;
for(let i0=0; i0<len0; i0++){
if(!(validate89(data3[i0], {instancePath:instancePath+"/shows/" + i0,parentData:data3,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate89.errors : vErrors.concat(validate89.errors);
errors = vErrors.length;
}
}
}
else {
const err8 = {instancePath:instancePath+"/shows",schemaPath:"#/properties/shows/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
}
if(data.dueOn !== undefined){
let data5 = data.dueOn;
if(typeof data5 === "string"){
if(!pattern5.test(data5)){
const err9 = {instancePath:instancePath+"/dueOn",schemaPath:"#/properties/dueOn/pattern",keyword:"pattern",params:{pattern: "^[0-9]{4}-[0-9]{2}-[0-9]{2}$"},message:"must match pattern \""+"^[0-9]{4}-[0-9]{2}-[0-9]{2}$"+"\""};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
else {
const err10 = {instancePath:instancePath+"/dueOn",schemaPath:"#/properties/dueOn/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
}
else {
const err11 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
validate86.errors = vErrors;
return errors === 0;
}
validate86.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate83(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate83.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.role === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "role"},message:"must have required property '"+"role"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.instrument === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "instrument"},message:"must have required property '"+"instrument"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!(((key0 === "role") || (key0 === "instrument")) || (key0 === "overdueBecause"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.role !== undefined){
if(!(validate84(data.role, {instancePath:instancePath+"/role",parentData:data,parentDataProperty:"role",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.instrument !== undefined){
if(!(validate86(data.instrument, {instancePath:instancePath+"/instrument",parentData:data,parentDataProperty:"instrument",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate86.errors : vErrors.concat(validate86.errors);
errors = vErrors.length;
}
}
if(data.overdueBecause !== undefined){
if(!(validate66(data.overdueBecause, {instancePath:instancePath+"/overdueBecause",parentData:data,parentDataProperty:"overdueBecause",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate83.errors = vErrors;
return errors === 0;
}
validate83.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema35 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"}},"required":["step"],"additionalProperties":false};
const schema36 = {"type":"string","pattern":"^[A-Za-z][A-Za-z0-9-]*$","maxLength":60};
const pattern6 = new RegExp("^[A-Za-z][A-Za-z0-9-]*$", "u");

function validate97(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate97.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(func1(data) > 60){
const err0 = {instancePath,schemaPath:"#/maxLength",keyword:"maxLength",params:{limit: 60},message:"must NOT have more than 60 characters"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(!pattern6.test(data)){
const err1 = {instancePath,schemaPath:"#/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z][A-Za-z0-9-]*$"},message:"must match pattern \""+"^[A-Za-z][A-Za-z0-9-]*$"+"\""};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate97.errors = vErrors;
return errors === 0;
}
validate97.evaluated = {"dynamicProps":false,"dynamicItems":false};


function validate96(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate96.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
for(const key0 in data){
if(!(key0 === "step")){
const err1 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate96.errors = vErrors;
return errors === 0;
}
validate96.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema37 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"}},"required":["step"],"additionalProperties":false};

function validate100(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate100.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
for(const key0 in data){
if(!(key0 === "step")){
const err1 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate100.errors = vErrors;
return errors === 0;
}
validate100.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema38 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"caution":{"type":"integer","minimum":0,"maximum":1000}},"required":["step","caution"],"additionalProperties":false};

function validate103(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate103.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.caution === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "caution"},message:"must have required property '"+"caution"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "step") || (key0 === "caution"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.caution !== undefined){
let data1 = data.caution;
if(!(((typeof data1 == "number") && (!(data1 % 1) && !isNaN(data1))) && (isFinite(data1)))){
const err3 = {instancePath:instancePath+"/caution",schemaPath:"#/properties/caution/type",keyword:"type",params:{type: "integer"},message:"must be integer"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if((typeof data1 == "number") && (isFinite(data1))){
if(data1 > 1000 || isNaN(data1)){
const err4 = {instancePath:instancePath+"/caution",schemaPath:"#/properties/caution/maximum",keyword:"maximum",params:{comparison: "<=", limit: 1000},message:"must be <= 1000"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data1 < 0 || isNaN(data1)){
const err5 = {instancePath:instancePath+"/caution",schemaPath:"#/properties/caution/minimum",keyword:"minimum",params:{comparison: ">=", limit: 0},message:"must be >= 0"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
}
}
else {
const err6 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
validate103.errors = vErrors;
return errors === 0;
}
validate103.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema39 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"name":{"$ref":"#/$defs/id"},"figure":{"$ref":"#/$defs/figure"},"source":{"$ref":"#/$defs/source"},"way":{"$ref":"#/$defs/id"},"instrument":{"$ref":"#/$defs/id"},"resolution":{"$ref":"#/$defs/figureText"},"uncertainty":{"$ref":"#/$defs/figureText"},"timeS":{"type":"number","minimum":0}},"required":["step","name","figure","source"],"additionalProperties":false};
const func11 = Object.prototype.hasOwnProperty;
const schema40 = {"enum":["typed","file","simulated","computed"]};

function validate110(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate110.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(!((((data === "typed") || (data === "file")) || (data === "simulated")) || (data === "computed"))){
const err0 = {instancePath,schemaPath:"#/enum",keyword:"enum",params:{allowedValues: schema40.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
validate110.errors = vErrors;
return errors === 0;
}
validate110.evaluated = {"dynamicProps":false,"dynamicItems":false};


function validate106(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate106.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.name === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.figure === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "figure"},message:"must have required property '"+"figure"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.source === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "source"},message:"must have required property '"+"source"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!(func11.call(schema39.properties, key0))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.name !== undefined){
if(!(validate84(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.figure !== undefined){
if(!(validate58(data.figure, {instancePath:instancePath+"/figure",parentData:data,parentDataProperty:"figure",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate58.errors : vErrors.concat(validate58.errors);
errors = vErrors.length;
}
}
if(data.source !== undefined){
if(!(validate110(data.source, {instancePath:instancePath+"/source",parentData:data,parentDataProperty:"source",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate110.errors : vErrors.concat(validate110.errors);
errors = vErrors.length;
}
}
if(data.way !== undefined){
if(!(validate84(data.way, {instancePath:instancePath+"/way",parentData:data,parentDataProperty:"way",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.instrument !== undefined){
if(!(validate84(data.instrument, {instancePath:instancePath+"/instrument",parentData:data,parentDataProperty:"instrument",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.resolution !== undefined){
if(!(validate59(data.resolution, {instancePath:instancePath+"/resolution",parentData:data,parentDataProperty:"resolution",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate59.errors : vErrors.concat(validate59.errors);
errors = vErrors.length;
}
}
if(data.uncertainty !== undefined){
if(!(validate59(data.uncertainty, {instancePath:instancePath+"/uncertainty",parentData:data,parentDataProperty:"uncertainty",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate59.errors : vErrors.concat(validate59.errors);
errors = vErrors.length;
}
}
if(data.timeS !== undefined){
let data8 = data.timeS;
if((typeof data8 == "number") && (isFinite(data8))){
if(data8 < 0 || isNaN(data8)){
const err5 = {instancePath:instancePath+"/timeS",schemaPath:"#/properties/timeS/minimum",keyword:"minimum",params:{comparison: ">=", limit: 0},message:"must be >= 0"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
else {
const err6 = {instancePath:instancePath+"/timeS",schemaPath:"#/properties/timeS/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
}
else {
const err7 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
validate106.errors = vErrors;
return errors === 0;
}
validate106.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema41 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"reason":{"$ref":"#/$defs/words"}},"required":["step","reason"],"additionalProperties":false};

function validate117(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate117.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.reason === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "reason"},message:"must have required property '"+"reason"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "step") || (key0 === "reason"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.reason !== undefined){
if(!(validate66(data.reason, {instancePath:instancePath+"/reason",parentData:data,parentDataProperty:"reason",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate117.errors = vErrors;
return errors === 0;
}
validate117.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema42 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"reason":{"$ref":"#/$defs/words"}},"required":["step","reason"],"additionalProperties":false};

function validate121(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate121.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.reason === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "reason"},message:"must have required property '"+"reason"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "step") || (key0 === "reason"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.reason !== undefined){
if(!(validate66(data.reason, {instancePath:instancePath+"/reason",parentData:data,parentDataProperty:"reason",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate121.errors = vErrors;
return errors === 0;
}
validate121.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema43 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"option":{"$ref":"#/$defs/id"}},"required":["step","option"],"additionalProperties":false};

function validate125(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate125.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.option === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "option"},message:"must have required property '"+"option"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "step") || (key0 === "option"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.option !== undefined){
if(!(validate84(data.option, {instancePath:instancePath+"/option",parentData:data,parentDataProperty:"option",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate125.errors = vErrors;
return errors === 0;
}
validate125.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema44 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"name":{"$ref":"#/$defs/id"},"sha256":{"$ref":"#/$defs/hash"},"bytes":{"$ref":"#/$defs/count"},"samples":{"$ref":"#/$defs/count"},"durationS":{"type":"number","minimum":0},"channels":{"type":"array","items":{"type":"object","properties":{"name":{"$ref":"#/$defs/label"},"unit":{"type":"string","maxLength":40},"column":{"$ref":"#/$defs/label"}},"required":["name","unit","column"],"additionalProperties":false},"maxItems":200},"source":{"$ref":"#/$defs/source"},"fileName":{"type":"string","maxLength":400},"skipped":{"$ref":"#/$defs/count"},"problems":{"type":"array","items":{"$ref":"#/$defs/words"},"maxItems":100}},"required":["step","name","sha256","bytes","samples","durationS","channels","source","skipped","problems"],"additionalProperties":false};
const schema45 = {"description":"SHA-256, hexadecimal.","type":"string","pattern":"^[0-9a-f]{64}$"};
const pattern7 = new RegExp("^[0-9a-f]{64}$", "u");

function validate132(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate132.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(!pattern7.test(data)){
const err0 = {instancePath,schemaPath:"#/pattern",keyword:"pattern",params:{pattern: "^[0-9a-f]{64}$"},message:"must match pattern \""+"^[0-9a-f]{64}$"+"\""};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
}
else {
const err1 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
validate132.errors = vErrors;
return errors === 0;
}
validate132.evaluated = {"dynamicProps":false,"dynamicItems":false};

const schema46 = {"type":"integer","minimum":0,"maximum":9007199254740991};

function validate134(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate134.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(!(((typeof data == "number") && (!(data % 1) && !isNaN(data))) && (isFinite(data)))){
const err0 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "integer"},message:"must be integer"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if((typeof data == "number") && (isFinite(data))){
if(data > 9007199254740991 || isNaN(data)){
const err1 = {instancePath,schemaPath:"#/maximum",keyword:"maximum",params:{comparison: "<=", limit: 9007199254740991},message:"must be <= 9007199254740991"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data < 0 || isNaN(data)){
const err2 = {instancePath,schemaPath:"#/minimum",keyword:"minimum",params:{comparison: ">=", limit: 0},message:"must be >= 0"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
validate134.errors = vErrors;
return errors === 0;
}
validate134.evaluated = {"dynamicProps":false,"dynamicItems":false};


function validate129(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate129.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.name === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.sha256 === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "sha256"},message:"must have required property '"+"sha256"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.bytes === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "bytes"},message:"must have required property '"+"bytes"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.samples === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "samples"},message:"must have required property '"+"samples"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.durationS === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "durationS"},message:"must have required property '"+"durationS"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data.channels === undefined){
const err6 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "channels"},message:"must have required property '"+"channels"+"'"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data.source === undefined){
const err7 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "source"},message:"must have required property '"+"source"+"'"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
if(data.skipped === undefined){
const err8 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "skipped"},message:"must have required property '"+"skipped"+"'"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(data.problems === undefined){
const err9 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "problems"},message:"must have required property '"+"problems"+"'"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
for(const key0 in data){
if(!(func11.call(schema44.properties, key0))){
const err10 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.name !== undefined){
if(!(validate84(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.sha256 !== undefined){
if(!(validate132(data.sha256, {instancePath:instancePath+"/sha256",parentData:data,parentDataProperty:"sha256",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate132.errors : vErrors.concat(validate132.errors);
errors = vErrors.length;
}
}
if(data.bytes !== undefined){
if(!(validate134(data.bytes, {instancePath:instancePath+"/bytes",parentData:data,parentDataProperty:"bytes",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate134.errors : vErrors.concat(validate134.errors);
errors = vErrors.length;
}
}
if(data.samples !== undefined){
if(!(validate134(data.samples, {instancePath:instancePath+"/samples",parentData:data,parentDataProperty:"samples",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate134.errors : vErrors.concat(validate134.errors);
errors = vErrors.length;
}
}
if(data.durationS !== undefined){
let data5 = data.durationS;
if((typeof data5 == "number") && (isFinite(data5))){
if(data5 < 0 || isNaN(data5)){
const err11 = {instancePath:instancePath+"/durationS",schemaPath:"#/properties/durationS/minimum",keyword:"minimum",params:{comparison: ">=", limit: 0},message:"must be >= 0"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
else {
const err12 = {instancePath:instancePath+"/durationS",schemaPath:"#/properties/durationS/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
}
if(data.channels !== undefined){
let data6 = data.channels;
if(Array.isArray(data6)){
if(data6.length > 200){
const err13 = {instancePath:instancePath+"/channels",schemaPath:"#/properties/channels/maxItems",keyword:"maxItems",params:{limit: 200},message:"must NOT have more than 200 items"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
let data7 = data6[i0];
if(data7 && typeof data7 == "object" && !Array.isArray(data7)){
if(data7.name === undefined){
const err14 = {instancePath:instancePath+"/channels/" + i0,schemaPath:"#/properties/channels/items/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
if(data7.unit === undefined){
const err15 = {instancePath:instancePath+"/channels/" + i0,schemaPath:"#/properties/channels/items/required",keyword:"required",params:{missingProperty: "unit"},message:"must have required property '"+"unit"+"'"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
if(data7.column === undefined){
const err16 = {instancePath:instancePath+"/channels/" + i0,schemaPath:"#/properties/channels/items/required",keyword:"required",params:{missingProperty: "column"},message:"must have required property '"+"column"+"'"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
for(const key1 in data7){
if(!(((key1 === "name") || (key1 === "unit")) || (key1 === "column"))){
const err17 = {instancePath:instancePath+"/channels/" + i0,schemaPath:"#/properties/channels/items/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key1},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
}
if(data7.name !== undefined){
if(!(validate55(data7.name, {instancePath:instancePath+"/channels/" + i0+"/name",parentData:data7,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data7.unit !== undefined){
let data9 = data7.unit;
if(typeof data9 === "string"){
if(func1(data9) > 40){
const err18 = {instancePath:instancePath+"/channels/" + i0+"/unit",schemaPath:"#/properties/channels/items/properties/unit/maxLength",keyword:"maxLength",params:{limit: 40},message:"must NOT have more than 40 characters"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
}
else {
const err19 = {instancePath:instancePath+"/channels/" + i0+"/unit",schemaPath:"#/properties/channels/items/properties/unit/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
}
if(data7.column !== undefined){
if(!(validate55(data7.column, {instancePath:instancePath+"/channels/" + i0+"/column",parentData:data7,parentDataProperty:"column",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
}
else {
const err20 = {instancePath:instancePath+"/channels/" + i0,schemaPath:"#/properties/channels/items/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
}
}
else {
const err21 = {instancePath:instancePath+"/channels",schemaPath:"#/properties/channels/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
}
if(data.source !== undefined){
if(!(validate110(data.source, {instancePath:instancePath+"/source",parentData:data,parentDataProperty:"source",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate110.errors : vErrors.concat(validate110.errors);
errors = vErrors.length;
}
}
if(data.fileName !== undefined){
let data12 = data.fileName;
if(typeof data12 === "string"){
if(func1(data12) > 400){
const err22 = {instancePath:instancePath+"/fileName",schemaPath:"#/properties/fileName/maxLength",keyword:"maxLength",params:{limit: 400},message:"must NOT have more than 400 characters"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
}
else {
const err23 = {instancePath:instancePath+"/fileName",schemaPath:"#/properties/fileName/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
}
if(data.skipped !== undefined){
if(!(validate134(data.skipped, {instancePath:instancePath+"/skipped",parentData:data,parentDataProperty:"skipped",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate134.errors : vErrors.concat(validate134.errors);
errors = vErrors.length;
}
}
if(data.problems !== undefined){
let data14 = data.problems;
if(Array.isArray(data14)){
if(data14.length > 100){
const err24 = {instancePath:instancePath+"/problems",schemaPath:"#/properties/problems/maxItems",keyword:"maxItems",params:{limit: 100},message:"must NOT have more than 100 items"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
const len1 = data14.length;
for(let i1=0; i1<len1; i1++){
if(!(validate66(data14[i1], {instancePath:instancePath+"/problems/" + i1,parentData:data14,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err25 = {instancePath:instancePath+"/problems",schemaPath:"#/properties/problems/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err25];
}
else {
vErrors.push(err25);
}
errors++;
}
}
}
else {
const err26 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err26];
}
else {
vErrors.push(err26);
}
errors++;
}
validate129.errors = vErrors;
return errors === 0;
}
validate129.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema47 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"series":{"$ref":"#/$defs/id"},"mark":{"enum":["noise-begins","noise-stops"]},"timeS":{"type":"number","minimum":0},"by":{"enum":["tap","pedal","suggested"]}},"required":["step","series","mark","timeS","by"],"additionalProperties":false};

function validate143(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate143.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.series === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "series"},message:"must have required property '"+"series"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.mark === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "mark"},message:"must have required property '"+"mark"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.timeS === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "timeS"},message:"must have required property '"+"timeS"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.by === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "by"},message:"must have required property '"+"by"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
for(const key0 in data){
if(!(((((key0 === "step") || (key0 === "series")) || (key0 === "mark")) || (key0 === "timeS")) || (key0 === "by"))){
const err5 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.series !== undefined){
if(!(validate84(data.series, {instancePath:instancePath+"/series",parentData:data,parentDataProperty:"series",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.mark !== undefined){
let data2 = data.mark;
if(!((data2 === "noise-begins") || (data2 === "noise-stops"))){
const err6 = {instancePath:instancePath+"/mark",schemaPath:"#/properties/mark/enum",keyword:"enum",params:{allowedValues: schema47.properties.mark.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
if(data.timeS !== undefined){
let data3 = data.timeS;
if((typeof data3 == "number") && (isFinite(data3))){
if(data3 < 0 || isNaN(data3)){
const err7 = {instancePath:instancePath+"/timeS",schemaPath:"#/properties/timeS/minimum",keyword:"minimum",params:{comparison: ">=", limit: 0},message:"must be >= 0"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
else {
const err8 = {instancePath:instancePath+"/timeS",schemaPath:"#/properties/timeS/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
}
if(data.by !== undefined){
let data4 = data.by;
if(!(((data4 === "tap") || (data4 === "pedal")) || (data4 === "suggested"))){
const err9 = {instancePath:instancePath+"/by",schemaPath:"#/properties/by/enum",keyword:"enum",params:{allowedValues: schema47.properties.by.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
}
else {
const err10 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
validate143.errors = vErrors;
return errors === 0;
}
validate143.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema48 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"name":{"$ref":"#/$defs/id"},"codes":{"type":"array","items":{"$ref":"#/$defs/code"},"maxItems":200}},"required":["step","name","codes"],"additionalProperties":false};
const schema49 = {"type":"object","properties":{"code":{"type":"string","minLength":1,"maxLength":20},"status":{"enum":["stored","pending","permanent"]},"freezeFrame":{"$ref":"#/$defs/words"}},"required":["code","status"],"additionalProperties":false};

function validate150(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate150.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.code === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "code"},message:"must have required property '"+"code"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.status === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "status"},message:"must have required property '"+"status"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!(((key0 === "code") || (key0 === "status")) || (key0 === "freezeFrame"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.code !== undefined){
let data0 = data.code;
if(typeof data0 === "string"){
if(func1(data0) > 20){
const err3 = {instancePath:instancePath+"/code",schemaPath:"#/properties/code/maxLength",keyword:"maxLength",params:{limit: 20},message:"must NOT have more than 20 characters"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(func1(data0) < 1){
const err4 = {instancePath:instancePath+"/code",schemaPath:"#/properties/code/minLength",keyword:"minLength",params:{limit: 1},message:"must NOT have fewer than 1 characters"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
else {
const err5 = {instancePath:instancePath+"/code",schemaPath:"#/properties/code/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.status !== undefined){
let data1 = data.status;
if(!(((data1 === "stored") || (data1 === "pending")) || (data1 === "permanent"))){
const err6 = {instancePath:instancePath+"/status",schemaPath:"#/properties/status/enum",keyword:"enum",params:{allowedValues: schema49.properties.status.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
if(data.freezeFrame !== undefined){
if(!(validate66(data.freezeFrame, {instancePath:instancePath+"/freezeFrame",parentData:data,parentDataProperty:"freezeFrame",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err7 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
validate150.errors = vErrors;
return errors === 0;
}
validate150.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate147(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate147.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.name === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.codes === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "codes"},message:"must have required property '"+"codes"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
for(const key0 in data){
if(!(((key0 === "step") || (key0 === "name")) || (key0 === "codes"))){
const err3 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.name !== undefined){
if(!(validate84(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.codes !== undefined){
let data2 = data.codes;
if(Array.isArray(data2)){
if(data2.length > 200){
const err4 = {instancePath:instancePath+"/codes",schemaPath:"#/properties/codes/maxItems",keyword:"maxItems",params:{limit: 200},message:"must NOT have more than 200 items"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
const len0 = data2.length;
for(let i0=0; i0<len0; i0++){
if(!(validate150(data2[i0], {instancePath:instancePath+"/codes/" + i0,parentData:data2,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate150.errors : vErrors.concat(validate150.errors);
errors = vErrors.length;
}
}
}
else {
const err5 = {instancePath:instancePath+"/codes",schemaPath:"#/properties/codes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
}
else {
const err6 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
validate147.errors = vErrors;
return errors === 0;
}
validate147.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema50 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"seconds":{"type":"number","minimum":0}},"required":["step","seconds"],"additionalProperties":false};

function validate154(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate154.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.seconds === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "seconds"},message:"must have required property '"+"seconds"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "step") || (key0 === "seconds"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.seconds !== undefined){
let data1 = data.seconds;
if((typeof data1 == "number") && (isFinite(data1))){
if(data1 < 0 || isNaN(data1)){
const err3 = {instancePath:instancePath+"/seconds",schemaPath:"#/properties/seconds/minimum",keyword:"minimum",params:{comparison: ">=", limit: 0},message:"must be >= 0"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
else {
const err4 = {instancePath:instancePath+"/seconds",schemaPath:"#/properties/seconds/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
}
else {
const err5 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
validate154.errors = vErrors;
return errors === 0;
}
validate154.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema51 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"certain":{"type":"boolean"}},"required":["step","certain"],"additionalProperties":false};

function validate157(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate157.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.certain === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "certain"},message:"must have required property '"+"certain"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "step") || (key0 === "certain"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.certain !== undefined){
if(typeof data.certain !== "boolean"){
const err3 = {instancePath:instancePath+"/certain",schemaPath:"#/properties/certain/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
}
else {
const err4 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
validate157.errors = vErrors;
return errors === 0;
}
validate157.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema52 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"name":{"$ref":"#/$defs/id"},"options":{"type":"array","items":{"$ref":"#/$defs/id"},"maxItems":50},"text":{"$ref":"#/$defs/words"}},"required":["step","name","options"],"additionalProperties":false};

function validate160(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate160.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.name === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.options === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "options"},message:"must have required property '"+"options"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
for(const key0 in data){
if(!((((key0 === "step") || (key0 === "name")) || (key0 === "options")) || (key0 === "text"))){
const err3 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.name !== undefined){
if(!(validate84(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.options !== undefined){
let data2 = data.options;
if(Array.isArray(data2)){
if(data2.length > 50){
const err4 = {instancePath:instancePath+"/options",schemaPath:"#/properties/options/maxItems",keyword:"maxItems",params:{limit: 50},message:"must NOT have more than 50 items"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
const len0 = data2.length;
for(let i0=0; i0<len0; i0++){
if(!(validate84(data2[i0], {instancePath:instancePath+"/options/" + i0,parentData:data2,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
}
else {
const err5 = {instancePath:instancePath+"/options",schemaPath:"#/properties/options/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.text !== undefined){
if(!(validate66(data.text, {instancePath:instancePath+"/text",parentData:data,parentDataProperty:"text",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err6 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
validate160.errors = vErrors;
return errors === 0;
}
validate160.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema53 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"sha256":{"$ref":"#/$defs/hash"},"bytes":{"$ref":"#/$defs/count"},"mediaType":{"type":"string","maxLength":100}},"required":["step","sha256","bytes","mediaType"],"additionalProperties":false};

function validate166(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate166.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.sha256 === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "sha256"},message:"must have required property '"+"sha256"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.bytes === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "bytes"},message:"must have required property '"+"bytes"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.mediaType === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "mediaType"},message:"must have required property '"+"mediaType"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!((((key0 === "step") || (key0 === "sha256")) || (key0 === "bytes")) || (key0 === "mediaType"))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.sha256 !== undefined){
if(!(validate132(data.sha256, {instancePath:instancePath+"/sha256",parentData:data,parentDataProperty:"sha256",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate132.errors : vErrors.concat(validate132.errors);
errors = vErrors.length;
}
}
if(data.bytes !== undefined){
if(!(validate134(data.bytes, {instancePath:instancePath+"/bytes",parentData:data,parentDataProperty:"bytes",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate134.errors : vErrors.concat(validate134.errors);
errors = vErrors.length;
}
}
if(data.mediaType !== undefined){
let data3 = data.mediaType;
if(typeof data3 === "string"){
if(func1(data3) > 100){
const err5 = {instancePath:instancePath+"/mediaType",schemaPath:"#/properties/mediaType/maxLength",keyword:"maxLength",params:{limit: 100},message:"must NOT have more than 100 characters"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
else {
const err6 = {instancePath:instancePath+"/mediaType",schemaPath:"#/properties/mediaType/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
}
else {
const err7 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
validate166.errors = vErrors;
return errors === 0;
}
validate166.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema54 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"text":{"$ref":"#/$defs/words"}},"required":["step","text"],"additionalProperties":false};

function validate171(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate171.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.text === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "text"},message:"must have required property '"+"text"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "step") || (key0 === "text"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.text !== undefined){
if(!(validate66(data.text, {instancePath:instancePath+"/text",parentData:data,parentDataProperty:"text",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate171.errors = vErrors;
return errors === 0;
}
validate171.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema55 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"text":{"$ref":"#/$defs/words"}},"required":["step","text"],"additionalProperties":false};

function validate175(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate175.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.text === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "text"},message:"must have required property '"+"text"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "step") || (key0 === "text"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.text !== undefined){
if(!(validate66(data.text, {instancePath:instancePath+"/text",parentData:data,parentDataProperty:"text",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate175.errors = vErrors;
return errors === 0;
}
validate175.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema56 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"item":{"$ref":"#/$defs/id"},"label":{"$ref":"#/$defs/label"}},"required":["step","item","label"],"additionalProperties":false};

function validate179(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate179.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.item === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "item"},message:"must have required property '"+"item"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.label === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
for(const key0 in data){
if(!(((key0 === "step") || (key0 === "item")) || (key0 === "label"))){
const err3 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.item !== undefined){
if(!(validate84(data.item, {instancePath:instancePath+"/item",parentData:data,parentDataProperty:"item",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
}
else {
const err4 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
validate179.errors = vErrors;
return errors === 0;
}
validate179.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema57 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"item":{"$ref":"#/$defs/id"}},"required":["step","item"],"additionalProperties":false};

function validate184(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate184.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.item === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "item"},message:"must have required property '"+"item"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "step") || (key0 === "item"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.item !== undefined){
if(!(validate84(data.item, {instancePath:instancePath+"/item",parentData:data,parentDataProperty:"item",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate184.errors = vErrors;
return errors === 0;
}
validate184.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema58 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"to":{"$ref":"#/$defs/step"},"exit":{"type":"string","minLength":1,"maxLength":60},"when":{"type":"string","maxLength":2000},"inputs":{"type":"array","items":{"$ref":"#/$defs/decisionInput"},"maxItems":400},"because":{"$ref":"#/$defs/words"},"verdict":{"$ref":"#/$defs/step"},"reason":{"$ref":"#/$defs/words"}},"required":["step","to","exit","inputs","because"],"additionalProperties":false};
const schema59 = {"type":"object","properties":{"name":{"$ref":"#/$defs/id"},"label":{"$ref":"#/$defs/label"},"text":{"type":"string","maxLength":200},"unit":{"$ref":"#/$defs/unit"},"uncertainty":{"$ref":"#/$defs/figureText"}},"required":["name","label","text"],"additionalProperties":false};

function validate191(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate191.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.name === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.label === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.text === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "text"},message:"must have required property '"+"text"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
for(const key0 in data){
if(!(((((key0 === "name") || (key0 === "label")) || (key0 === "text")) || (key0 === "unit")) || (key0 === "uncertainty"))){
const err3 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.name !== undefined){
if(!(validate84(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.text !== undefined){
let data2 = data.text;
if(typeof data2 === "string"){
if(func1(data2) > 200){
const err4 = {instancePath:instancePath+"/text",schemaPath:"#/properties/text/maxLength",keyword:"maxLength",params:{limit: 200},message:"must NOT have more than 200 characters"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
else {
const err5 = {instancePath:instancePath+"/text",schemaPath:"#/properties/text/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.unit !== undefined){
if(!(validate61(data.unit, {instancePath:instancePath+"/unit",parentData:data,parentDataProperty:"unit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.uncertainty !== undefined){
if(!(validate59(data.uncertainty, {instancePath:instancePath+"/uncertainty",parentData:data,parentDataProperty:"uncertainty",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate59.errors : vErrors.concat(validate59.errors);
errors = vErrors.length;
}
}
}
else {
const err6 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
validate191.errors = vErrors;
return errors === 0;
}
validate191.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate188(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate188.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.to === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "to"},message:"must have required property '"+"to"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.exit === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "exit"},message:"must have required property '"+"exit"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.inputs === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "inputs"},message:"must have required property '"+"inputs"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.because === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "because"},message:"must have required property '"+"because"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
for(const key0 in data){
if(!((((((((key0 === "step") || (key0 === "to")) || (key0 === "exit")) || (key0 === "when")) || (key0 === "inputs")) || (key0 === "because")) || (key0 === "verdict")) || (key0 === "reason"))){
const err5 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.to !== undefined){
if(!(validate97(data.to, {instancePath:instancePath+"/to",parentData:data,parentDataProperty:"to",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.exit !== undefined){
let data2 = data.exit;
if(typeof data2 === "string"){
if(func1(data2) > 60){
const err6 = {instancePath:instancePath+"/exit",schemaPath:"#/properties/exit/maxLength",keyword:"maxLength",params:{limit: 60},message:"must NOT have more than 60 characters"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(func1(data2) < 1){
const err7 = {instancePath:instancePath+"/exit",schemaPath:"#/properties/exit/minLength",keyword:"minLength",params:{limit: 1},message:"must NOT have fewer than 1 characters"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
else {
const err8 = {instancePath:instancePath+"/exit",schemaPath:"#/properties/exit/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
}
if(data.when !== undefined){
let data3 = data.when;
if(typeof data3 === "string"){
if(func1(data3) > 2000){
const err9 = {instancePath:instancePath+"/when",schemaPath:"#/properties/when/maxLength",keyword:"maxLength",params:{limit: 2000},message:"must NOT have more than 2000 characters"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
else {
const err10 = {instancePath:instancePath+"/when",schemaPath:"#/properties/when/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.inputs !== undefined){
let data4 = data.inputs;
if(Array.isArray(data4)){
if(data4.length > 400){
const err11 = {instancePath:instancePath+"/inputs",schemaPath:"#/properties/inputs/maxItems",keyword:"maxItems",params:{limit: 400},message:"must NOT have more than 400 items"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
const len0 = data4.length;
for(let i0=0; i0<len0; i0++){
if(!(validate191(data4[i0], {instancePath:instancePath+"/inputs/" + i0,parentData:data4,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate191.errors : vErrors.concat(validate191.errors);
errors = vErrors.length;
}
}
}
else {
const err12 = {instancePath:instancePath+"/inputs",schemaPath:"#/properties/inputs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
}
if(data.because !== undefined){
if(!(validate66(data.because, {instancePath:instancePath+"/because",parentData:data,parentDataProperty:"because",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.verdict !== undefined){
if(!(validate97(data.verdict, {instancePath:instancePath+"/verdict",parentData:data,parentDataProperty:"verdict",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.reason !== undefined){
if(!(validate66(data.reason, {instancePath:instancePath+"/reason",parentData:data,parentDataProperty:"reason",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err13 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
validate188.errors = vErrors;
return errors === 0;
}
validate188.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema60 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"computed":{"$ref":"#/$defs/id"},"chosen":{"$ref":"#/$defs/id"},"reason":{"$ref":"#/$defs/words"}},"required":["step","computed","chosen","reason"],"additionalProperties":false};

function validate201(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate201.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.computed === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "computed"},message:"must have required property '"+"computed"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.chosen === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "chosen"},message:"must have required property '"+"chosen"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.reason === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "reason"},message:"must have required property '"+"reason"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!((((key0 === "step") || (key0 === "computed")) || (key0 === "chosen")) || (key0 === "reason"))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.computed !== undefined){
if(!(validate84(data.computed, {instancePath:instancePath+"/computed",parentData:data,parentDataProperty:"computed",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.chosen !== undefined){
if(!(validate84(data.chosen, {instancePath:instancePath+"/chosen",parentData:data,parentDataProperty:"chosen",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.reason !== undefined){
if(!(validate66(data.reason, {instancePath:instancePath+"/reason",parentData:data,parentDataProperty:"reason",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err5 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
validate201.errors = vErrors;
return errors === 0;
}
validate201.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema61 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"reason":{"$ref":"#/$defs/words"}},"required":["step","reason"],"additionalProperties":false};

function validate207(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate207.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.reason === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "reason"},message:"must have required property '"+"reason"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "step") || (key0 === "reason"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.reason !== undefined){
if(!(validate66(data.reason, {instancePath:instancePath+"/reason",parentData:data,parentDataProperty:"reason",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate207.errors = vErrors;
return errors === 0;
}
validate207.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema62 = {"type":"object","properties":{"seq":{"$ref":"#/$defs/seq"},"reason":{"$ref":"#/$defs/words"}},"required":["seq","reason"],"additionalProperties":false};
const schema63 = {"type":"integer","minimum":1,"maximum":9007199254740991};

function validate212(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate212.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(!(((typeof data == "number") && (!(data % 1) && !isNaN(data))) && (isFinite(data)))){
const err0 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "integer"},message:"must be integer"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if((typeof data == "number") && (isFinite(data))){
if(data > 9007199254740991 || isNaN(data)){
const err1 = {instancePath,schemaPath:"#/maximum",keyword:"maximum",params:{comparison: "<=", limit: 9007199254740991},message:"must be <= 9007199254740991"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data < 1 || isNaN(data)){
const err2 = {instancePath,schemaPath:"#/minimum",keyword:"minimum",params:{comparison: ">=", limit: 1},message:"must be >= 1"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
validate212.errors = vErrors;
return errors === 0;
}
validate212.evaluated = {"dynamicProps":false,"dynamicItems":false};


function validate211(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate211.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.seq === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "seq"},message:"must have required property '"+"seq"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.reason === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "reason"},message:"must have required property '"+"reason"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "seq") || (key0 === "reason"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.seq !== undefined){
if(!(validate212(data.seq, {instancePath:instancePath+"/seq",parentData:data,parentDataProperty:"seq",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate212.errors : vErrors.concat(validate212.errors);
errors = vErrors.length;
}
}
if(data.reason !== undefined){
if(!(validate66(data.reason, {instancePath:instancePath+"/reason",parentData:data,parentDataProperty:"reason",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate211.errors = vErrors;
return errors === 0;
}
validate211.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema64 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"question":{"$ref":"#/$defs/words"}},"required":["step","question"],"additionalProperties":false};

function validate216(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate216.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.question === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "question"},message:"must have required property '"+"question"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "step") || (key0 === "question"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.question !== undefined){
if(!(validate66(data.question, {instancePath:instancePath+"/question",parentData:data,parentDataProperty:"question",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate216.errors = vErrors;
return errors === 0;
}
validate216.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema65 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"evidence":{"$ref":"#/$defs/words"},"by":{"enum":["lead","manager"]}},"required":["step","evidence","by"],"additionalProperties":false};

function validate220(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate220.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.evidence === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "evidence"},message:"must have required property '"+"evidence"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.by === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "by"},message:"must have required property '"+"by"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
for(const key0 in data){
if(!(((key0 === "step") || (key0 === "evidence")) || (key0 === "by"))){
const err3 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.evidence !== undefined){
if(!(validate66(data.evidence, {instancePath:instancePath+"/evidence",parentData:data,parentDataProperty:"evidence",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.by !== undefined){
let data2 = data.by;
if(!((data2 === "lead") || (data2 === "manager"))){
const err4 = {instancePath:instancePath+"/by",schemaPath:"#/properties/by/enum",keyword:"enum",params:{allowedValues: schema65.properties.by.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
}
else {
const err5 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
validate220.errors = vErrors;
return errors === 0;
}
validate220.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema66 = {"type":"object","properties":{"reason":{"$ref":"#/$defs/words"}},"required":["reason"],"additionalProperties":false};

function validate224(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate224.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.reason === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "reason"},message:"must have required property '"+"reason"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
for(const key0 in data){
if(!(key0 === "reason")){
const err1 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
if(data.reason !== undefined){
if(!(validate66(data.reason, {instancePath:instancePath+"/reason",parentData:data,parentDataProperty:"reason",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate224.errors = vErrors;
return errors === 0;
}
validate224.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema67 = {"type":"object","properties":{"from":{"enum":["set-aside","stopped","reload","lead-called"]},"reason":{"$ref":"#/$defs/words"}},"required":["from"],"additionalProperties":false};

function validate227(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate227.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.from === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "from"},message:"must have required property '"+"from"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "from") || (key0 === "reason"))){
const err1 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
if(data.from !== undefined){
let data0 = data.from;
if(!((((data0 === "set-aside") || (data0 === "stopped")) || (data0 === "reload")) || (data0 === "lead-called"))){
const err2 = {instancePath:instancePath+"/from",schemaPath:"#/properties/from/enum",keyword:"enum",params:{allowedValues: schema67.properties.from.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.reason !== undefined){
if(!(validate66(data.reason, {instancePath:instancePath+"/reason",parentData:data,parentDataProperty:"reason",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate227.errors = vErrors;
return errors === 0;
}
validate227.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema68 = {"type":"object","properties":{"to":{"$ref":"#/$defs/id"},"reason":{"$ref":"#/$defs/words"}},"required":["to","reason"],"additionalProperties":false};

function validate230(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate230.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.to === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "to"},message:"must have required property '"+"to"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.reason === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "reason"},message:"must have required property '"+"reason"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "to") || (key0 === "reason"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.to !== undefined){
if(!(validate84(data.to, {instancePath:instancePath+"/to",parentData:data,parentDataProperty:"to",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.reason !== undefined){
if(!(validate66(data.reason, {instancePath:instancePath+"/reason",parentData:data,parentDataProperty:"reason",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate230.errors = vErrors;
return errors === 0;
}
validate230.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema69 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"limit":{"$ref":"#/$defs/id"},"name":{"$ref":"#/$defs/id"},"figure":{"$ref":"#/$defs/figure"}},"required":["step","limit","name","figure"],"additionalProperties":false};

function validate234(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate234.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.limit === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "limit"},message:"must have required property '"+"limit"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.name === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.figure === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "figure"},message:"must have required property '"+"figure"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!((((key0 === "step") || (key0 === "limit")) || (key0 === "name")) || (key0 === "figure"))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.limit !== undefined){
if(!(validate84(data.limit, {instancePath:instancePath+"/limit",parentData:data,parentDataProperty:"limit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.name !== undefined){
if(!(validate84(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.figure !== undefined){
if(!(validate58(data.figure, {instancePath:instancePath+"/figure",parentData:data,parentDataProperty:"figure",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate58.errors : vErrors.concat(validate58.errors);
errors = vErrors.length;
}
}
}
else {
const err5 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
validate234.errors = vErrors;
return errors === 0;
}
validate234.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema70 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"text":{"$ref":"#/$defs/words"}},"required":["step","text"],"additionalProperties":false};

function validate240(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate240.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.text === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "text"},message:"must have required property '"+"text"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "step") || (key0 === "text"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.text !== undefined){
if(!(validate66(data.text, {instancePath:instancePath+"/text",parentData:data,parentDataProperty:"text",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate240.errors = vErrors;
return errors === 0;
}
validate240.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema71 = {"type":"object","properties":{"seq":{"$ref":"#/$defs/seq"}},"required":["seq"],"additionalProperties":false};

function validate244(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate244.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.seq === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "seq"},message:"must have required property '"+"seq"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
for(const key0 in data){
if(!(key0 === "seq")){
const err1 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
if(data.seq !== undefined){
if(!(validate212(data.seq, {instancePath:instancePath+"/seq",parentData:data,parentDataProperty:"seq",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate212.errors : vErrors.concat(validate212.errors);
errors = vErrors.length;
}
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate244.errors = vErrors;
return errors === 0;
}
validate244.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema72 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"reason":{"$ref":"#/$defs/words"}},"required":["step","reason"],"additionalProperties":false};

function validate247(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate247.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.reason === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "reason"},message:"must have required property '"+"reason"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "step") || (key0 === "reason"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.reason !== undefined){
if(!(validate66(data.reason, {instancePath:instancePath+"/reason",parentData:data,parentDataProperty:"reason",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate247.errors = vErrors;
return errors === 0;
}
validate247.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema73 = {"type":"object","properties":{"version":{"$ref":"#/$defs/seq"},"answer":{"enum":["go-on","end"]}},"required":["version","answer"],"additionalProperties":false};

function validate251(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate251.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.version === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "version"},message:"must have required property '"+"version"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.answer === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "answer"},message:"must have required property '"+"answer"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "version") || (key0 === "answer"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.version !== undefined){
if(!(validate212(data.version, {instancePath:instancePath+"/version",parentData:data,parentDataProperty:"version",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate212.errors : vErrors.concat(validate212.errors);
errors = vErrors.length;
}
}
if(data.answer !== undefined){
let data1 = data.answer;
if(!((data1 === "go-on") || (data1 === "end"))){
const err3 = {instancePath:instancePath+"/answer",schemaPath:"#/properties/answer/enum",keyword:"enum",params:{allowedValues: schema73.properties.answer.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
}
else {
const err4 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
validate251.errors = vErrors;
return errors === 0;
}
validate251.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema74 = {"type":"object","properties":{"finding":{"$ref":"#/$defs/step"},"verdict":{"$ref":"#/$defs/words"}},"required":["finding","verdict"],"additionalProperties":false};

function validate254(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate254.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.finding === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "finding"},message:"must have required property '"+"finding"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.verdict === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "verdict"},message:"must have required property '"+"verdict"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "finding") || (key0 === "verdict"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.finding !== undefined){
if(!(validate97(data.finding, {instancePath:instancePath+"/finding",parentData:data,parentDataProperty:"finding",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.verdict !== undefined){
if(!(validate66(data.verdict, {instancePath:instancePath+"/verdict",parentData:data,parentDataProperty:"verdict",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate254.errors = vErrors;
return errors === 0;
}
validate254.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema75 = {"type":"object","properties":{"concern":{"$ref":"#/$defs/report"},"cause":{"$ref":"#/$defs/report"},"correction":{"$ref":"#/$defs/report"},"customer":{"$ref":"#/$defs/report"},"edited":{"type":"array","items":{"enum":["concern","cause","correction","customer"]},"maxItems":4}},"required":["concern","cause","correction","customer","edited"],"additionalProperties":false};
const schema76 = {"type":"string","maxLength":40000};

function validate259(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate259.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(func1(data) > 40000){
const err0 = {instancePath,schemaPath:"#/maxLength",keyword:"maxLength",params:{limit: 40000},message:"must NOT have more than 40000 characters"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
}
else {
const err1 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
validate259.errors = vErrors;
return errors === 0;
}
validate259.evaluated = {"dynamicProps":false,"dynamicItems":false};


function validate258(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate258.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.concern === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "concern"},message:"must have required property '"+"concern"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.cause === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "cause"},message:"must have required property '"+"cause"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.correction === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "correction"},message:"must have required property '"+"correction"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.customer === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "customer"},message:"must have required property '"+"customer"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.edited === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "edited"},message:"must have required property '"+"edited"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
for(const key0 in data){
if(!(((((key0 === "concern") || (key0 === "cause")) || (key0 === "correction")) || (key0 === "customer")) || (key0 === "edited"))){
const err5 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.concern !== undefined){
if(!(validate259(data.concern, {instancePath:instancePath+"/concern",parentData:data,parentDataProperty:"concern",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate259.errors : vErrors.concat(validate259.errors);
errors = vErrors.length;
}
}
if(data.cause !== undefined){
if(!(validate259(data.cause, {instancePath:instancePath+"/cause",parentData:data,parentDataProperty:"cause",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate259.errors : vErrors.concat(validate259.errors);
errors = vErrors.length;
}
}
if(data.correction !== undefined){
if(!(validate259(data.correction, {instancePath:instancePath+"/correction",parentData:data,parentDataProperty:"correction",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate259.errors : vErrors.concat(validate259.errors);
errors = vErrors.length;
}
}
if(data.customer !== undefined){
if(!(validate259(data.customer, {instancePath:instancePath+"/customer",parentData:data,parentDataProperty:"customer",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate259.errors : vErrors.concat(validate259.errors);
errors = vErrors.length;
}
}
if(data.edited !== undefined){
let data4 = data.edited;
if(Array.isArray(data4)){
if(data4.length > 4){
const err6 = {instancePath:instancePath+"/edited",schemaPath:"#/properties/edited/maxItems",keyword:"maxItems",params:{limit: 4},message:"must NOT have more than 4 items"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
const len0 = data4.length;
for(let i0=0; i0<len0; i0++){
let data5 = data4[i0];
if(!((((data5 === "concern") || (data5 === "cause")) || (data5 === "correction")) || (data5 === "customer"))){
const err7 = {instancePath:instancePath+"/edited/" + i0,schemaPath:"#/properties/edited/items/enum",keyword:"enum",params:{allowedValues: schema75.properties.edited.items.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
}
else {
const err8 = {instancePath:instancePath+"/edited",schemaPath:"#/properties/edited/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
}
}
else {
const err9 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
validate258.errors = vErrors;
return errors === 0;
}
validate258.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema77 = {"type":"object","properties":{"finding":{"$ref":"#/$defs/step"}},"required":["finding"],"additionalProperties":false};

function validate265(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate265.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.finding === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "finding"},message:"must have required property '"+"finding"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
for(const key0 in data){
if(!(key0 === "finding")){
const err1 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
if(data.finding !== undefined){
if(!(validate97(data.finding, {instancePath:instancePath+"/finding",parentData:data,parentDataProperty:"finding",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate265.errors = vErrors;
return errors === 0;
}
validate265.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema78 = {"type":"object","properties":{"step":{"$ref":"#/$defs/step"},"by":{"$ref":"#/$defs/id"}},"required":["step","by"],"additionalProperties":false};

function validate268(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate268.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.step === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "step"},message:"must have required property '"+"step"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.by === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "by"},message:"must have required property '"+"by"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "step") || (key0 === "by"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.step !== undefined){
if(!(validate97(data.step, {instancePath:instancePath+"/step",parentData:data,parentDataProperty:"step",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate97.errors : vErrors.concat(validate97.errors);
errors = vErrors.length;
}
}
if(data.by !== undefined){
if(!(validate84(data.by, {instancePath:instancePath+"/by",parentData:data,parentDataProperty:"by",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate268.errors = vErrors;
return errors === 0;
}
validate268.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema79 = {"type":"object","properties":{"head":{"$ref":"#/$defs/hash"},"meaning":{"enum":["performed","reviewed"]},"signature":{"type":"string","minLength":1,"maxLength":1000},"key":{"type":"string","minLength":1,"maxLength":1000}},"required":["head","meaning","signature","key"],"additionalProperties":false};

function validate272(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate272.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.head === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "head"},message:"must have required property '"+"head"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.meaning === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "meaning"},message:"must have required property '"+"meaning"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.signature === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "signature"},message:"must have required property '"+"signature"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.key === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "key"},message:"must have required property '"+"key"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!((((key0 === "head") || (key0 === "meaning")) || (key0 === "signature")) || (key0 === "key"))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.head !== undefined){
if(!(validate132(data.head, {instancePath:instancePath+"/head",parentData:data,parentDataProperty:"head",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate132.errors : vErrors.concat(validate132.errors);
errors = vErrors.length;
}
}
if(data.meaning !== undefined){
let data1 = data.meaning;
if(!((data1 === "performed") || (data1 === "reviewed"))){
const err5 = {instancePath:instancePath+"/meaning",schemaPath:"#/properties/meaning/enum",keyword:"enum",params:{allowedValues: schema79.properties.meaning.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.signature !== undefined){
let data2 = data.signature;
if(typeof data2 === "string"){
if(func1(data2) > 1000){
const err6 = {instancePath:instancePath+"/signature",schemaPath:"#/properties/signature/maxLength",keyword:"maxLength",params:{limit: 1000},message:"must NOT have more than 1000 characters"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(func1(data2) < 1){
const err7 = {instancePath:instancePath+"/signature",schemaPath:"#/properties/signature/minLength",keyword:"minLength",params:{limit: 1},message:"must NOT have fewer than 1 characters"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
else {
const err8 = {instancePath:instancePath+"/signature",schemaPath:"#/properties/signature/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
}
if(data.key !== undefined){
let data3 = data.key;
if(typeof data3 === "string"){
if(func1(data3) > 1000){
const err9 = {instancePath:instancePath+"/key",schemaPath:"#/properties/key/maxLength",keyword:"maxLength",params:{limit: 1000},message:"must NOT have more than 1000 characters"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
if(func1(data3) < 1){
const err10 = {instancePath:instancePath+"/key",schemaPath:"#/properties/key/minLength",keyword:"minLength",params:{limit: 1},message:"must NOT have fewer than 1 characters"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
else {
const err11 = {instancePath:instancePath+"/key",schemaPath:"#/properties/key/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
}
else {
const err12 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
validate272.errors = vErrors;
return errors === 0;
}
validate272.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema80 = {"type":"object","properties":{"text":{"$ref":"#/$defs/words"},"reason":{"$ref":"#/$defs/words"}},"required":["text","reason"],"additionalProperties":false};

function validate275(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate275.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.text === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "text"},message:"must have required property '"+"text"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.reason === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "reason"},message:"must have required property '"+"reason"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "text") || (key0 === "reason"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.text !== undefined){
if(!(validate66(data.text, {instancePath:instancePath+"/text",parentData:data,parentDataProperty:"text",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.reason !== undefined){
if(!(validate66(data.reason, {instancePath:instancePath+"/reason",parentData:data,parentDataProperty:"reason",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate275.errors = vErrors;
return errors === 0;
}
validate275.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema81 = {"type":"object","properties":{"branch":{"$ref":"#/$defs/id"},"head":{"$ref":"#/$defs/hash"}},"required":["branch","head"],"additionalProperties":false};

function validate279(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate279.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.branch === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "branch"},message:"must have required property '"+"branch"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.head === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "head"},message:"must have required property '"+"head"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "branch") || (key0 === "head"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.branch !== undefined){
if(!(validate84(data.branch, {instancePath:instancePath+"/branch",parentData:data,parentDataProperty:"branch",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.head !== undefined){
if(!(validate132(data.head, {instancePath:instancePath+"/head",parentData:data,parentDataProperty:"head",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate132.errors : vErrors.concat(validate132.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate279.errors = vErrors;
return errors === 0;
}
validate279.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema82 = {"type":"object","properties":{"byMs":{"type":"number"}},"required":["byMs"],"additionalProperties":false};

function validate283(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate283.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.byMs === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "byMs"},message:"must have required property '"+"byMs"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
for(const key0 in data){
if(!(key0 === "byMs")){
const err1 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
if(data.byMs !== undefined){
let data0 = data.byMs;
if(!((typeof data0 == "number") && (isFinite(data0)))){
const err2 = {instancePath:instancePath+"/byMs",schemaPath:"#/properties/byMs/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate283.errors = vErrors;
return errors === 0;
}
validate283.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema83 = {"type":"object","properties":{"from":{"$ref":"#/$defs/words"}},"required":["from"],"additionalProperties":false};

function validate285(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate285.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.from === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "from"},message:"must have required property '"+"from"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
for(const key0 in data){
if(!(key0 === "from")){
const err1 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
if(data.from !== undefined){
if(!(validate66(data.from, {instancePath:instancePath+"/from",parentData:data,parentDataProperty:"from",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate285.errors = vErrors;
return errors === 0;
}
validate285.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema84 = {"type":"string","pattern":"^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$"};
const pattern8 = new RegExp("^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$", "u");

function validate290(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate290.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(!pattern8.test(data)){
const err0 = {instancePath,schemaPath:"#/pattern",keyword:"pattern",params:{pattern: "^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$"},message:"must match pattern \""+"^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$"+"\""};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
}
else {
const err1 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
validate290.errors = vErrors;
return errors === 0;
}
validate290.evaluated = {"dynamicProps":false,"dynamicItems":false};


function validate52(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
/*# sourceURL="run-event.schema.json" */;
let vErrors = null;
let errors = 0;
const evaluated0 = validate52.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
const _errs2 = errors;
let valid1 = true;
const _errs3 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing0;
if((data.type === undefined) && (missing0 = "type")){
const err0 = {};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
else {
if(data.type !== undefined){
if("opened" !== data.type){
const err1 = {};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
}
}
var _valid0 = _errs3 === errors;
errors = _errs2;
if(vErrors !== null){
if(_errs2){
vErrors.length = _errs2;
}
else {
vErrors = null;
}
}
if(_valid0){
const _errs5 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate53(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate53.errors : vErrors.concat(validate53.errors);
errors = vErrors.length;
}
}
}
var _valid0 = _errs5 === errors;
valid1 = _valid0;
if(valid1){
var props0 = {};
props0.data = true;
props0.type = true;
}
}
if(!valid1){
const err2 = {instancePath,schemaPath:"#/allOf/0/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
const _errs8 = errors;
let valid4 = true;
const _errs9 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing1;
if((data.type === undefined) && (missing1 = "type")){
const err3 = {};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
else {
if(data.type !== undefined){
if("gear-chosen" !== data.type){
const err4 = {};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
}
}
var _valid1 = _errs9 === errors;
errors = _errs8;
if(vErrors !== null){
if(_errs8){
vErrors.length = _errs8;
}
else {
vErrors = null;
}
}
if(_valid1){
const _errs11 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate83(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate83.errors : vErrors.concat(validate83.errors);
errors = vErrors.length;
}
}
}
var _valid1 = _errs11 === errors;
valid4 = _valid1;
if(valid4){
var props1 = {};
props1.data = true;
props1.type = true;
}
}
if(!valid4){
const err5 = {instancePath,schemaPath:"#/allOf/1/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(props0 !== true && props1 !== undefined){
if(props1 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props1);
}
}
const _errs14 = errors;
let valid7 = true;
const _errs15 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing2;
if((data.type === undefined) && (missing2 = "type")){
const err6 = {};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
else {
if(data.type !== undefined){
if("step-claimed" !== data.type){
const err7 = {};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
}
}
var _valid2 = _errs15 === errors;
errors = _errs14;
if(vErrors !== null){
if(_errs14){
vErrors.length = _errs14;
}
else {
vErrors = null;
}
}
if(_valid2){
const _errs17 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate96(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate96.errors : vErrors.concat(validate96.errors);
errors = vErrors.length;
}
}
}
var _valid2 = _errs17 === errors;
valid7 = _valid2;
if(valid7){
var props2 = {};
props2.data = true;
props2.type = true;
}
}
if(!valid7){
const err8 = {instancePath,schemaPath:"#/allOf/2/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(props0 !== true && props2 !== undefined){
if(props2 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props2);
}
}
const _errs20 = errors;
let valid10 = true;
const _errs21 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing3;
if((data.type === undefined) && (missing3 = "type")){
const err9 = {};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
else {
if(data.type !== undefined){
if("step-done" !== data.type){
const err10 = {};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
}
}
var _valid3 = _errs21 === errors;
errors = _errs20;
if(vErrors !== null){
if(_errs20){
vErrors.length = _errs20;
}
else {
vErrors = null;
}
}
if(_valid3){
const _errs23 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate100(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate100.errors : vErrors.concat(validate100.errors);
errors = vErrors.length;
}
}
}
var _valid3 = _errs23 === errors;
valid10 = _valid3;
if(valid10){
var props3 = {};
props3.data = true;
props3.type = true;
}
}
if(!valid10){
const err11 = {instancePath,schemaPath:"#/allOf/3/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
if(props0 !== true && props3 !== undefined){
if(props3 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props3);
}
}
const _errs26 = errors;
let valid13 = true;
const _errs27 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing4;
if((data.type === undefined) && (missing4 = "type")){
const err12 = {};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
else {
if(data.type !== undefined){
if("caution-acknowledged" !== data.type){
const err13 = {};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
}
}
}
var _valid4 = _errs27 === errors;
errors = _errs26;
if(vErrors !== null){
if(_errs26){
vErrors.length = _errs26;
}
else {
vErrors = null;
}
}
if(_valid4){
const _errs29 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate103(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate103.errors : vErrors.concat(validate103.errors);
errors = vErrors.length;
}
}
}
var _valid4 = _errs29 === errors;
valid13 = _valid4;
if(valid13){
var props4 = {};
props4.data = true;
props4.type = true;
}
}
if(!valid13){
const err14 = {instancePath,schemaPath:"#/allOf/4/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
if(props0 !== true && props4 !== undefined){
if(props4 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props4);
}
}
const _errs32 = errors;
let valid16 = true;
const _errs33 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing5;
if((data.type === undefined) && (missing5 = "type")){
const err15 = {};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
else {
if(data.type !== undefined){
if("reading-recorded" !== data.type){
const err16 = {};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
}
}
}
var _valid5 = _errs33 === errors;
errors = _errs32;
if(vErrors !== null){
if(_errs32){
vErrors.length = _errs32;
}
else {
vErrors = null;
}
}
if(_valid5){
const _errs35 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate106(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
}
var _valid5 = _errs35 === errors;
valid16 = _valid5;
if(valid16){
var props5 = {};
props5.data = true;
props5.type = true;
}
}
if(!valid16){
const err17 = {instancePath,schemaPath:"#/allOf/5/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
if(props0 !== true && props5 !== undefined){
if(props5 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props5);
}
}
const _errs38 = errors;
let valid19 = true;
const _errs39 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing6;
if((data.type === undefined) && (missing6 = "type")){
const err18 = {};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
else {
if(data.type !== undefined){
if("not-measurable" !== data.type){
const err19 = {};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
}
}
}
var _valid6 = _errs39 === errors;
errors = _errs38;
if(vErrors !== null){
if(_errs38){
vErrors.length = _errs38;
}
else {
vErrors = null;
}
}
if(_valid6){
const _errs41 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate117(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate117.errors : vErrors.concat(validate117.errors);
errors = vErrors.length;
}
}
}
var _valid6 = _errs41 === errors;
valid19 = _valid6;
if(valid19){
var props6 = {};
props6.data = true;
props6.type = true;
}
}
if(!valid19){
const err20 = {instancePath,schemaPath:"#/allOf/6/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
if(props0 !== true && props6 !== undefined){
if(props6 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props6);
}
}
const _errs44 = errors;
let valid22 = true;
const _errs45 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing7;
if((data.type === undefined) && (missing7 = "type")){
const err21 = {};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
else {
if(data.type !== undefined){
if("not-applicable" !== data.type){
const err22 = {};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
}
}
}
var _valid7 = _errs45 === errors;
errors = _errs44;
if(vErrors !== null){
if(_errs44){
vErrors.length = _errs44;
}
else {
vErrors = null;
}
}
if(_valid7){
const _errs47 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate121(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate121.errors : vErrors.concat(validate121.errors);
errors = vErrors.length;
}
}
}
var _valid7 = _errs47 === errors;
valid22 = _valid7;
if(valid22){
var props7 = {};
props7.data = true;
props7.type = true;
}
}
if(!valid22){
const err23 = {instancePath,schemaPath:"#/allOf/7/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
if(props0 !== true && props7 !== undefined){
if(props7 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props7);
}
}
const _errs50 = errors;
let valid25 = true;
const _errs51 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing8;
if((data.type === undefined) && (missing8 = "type")){
const err24 = {};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
else {
if(data.type !== undefined){
if("predicted" !== data.type){
const err25 = {};
if(vErrors === null){
vErrors = [err25];
}
else {
vErrors.push(err25);
}
errors++;
}
}
}
}
var _valid8 = _errs51 === errors;
errors = _errs50;
if(vErrors !== null){
if(_errs50){
vErrors.length = _errs50;
}
else {
vErrors = null;
}
}
if(_valid8){
const _errs53 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate125(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
var _valid8 = _errs53 === errors;
valid25 = _valid8;
if(valid25){
var props8 = {};
props8.data = true;
props8.type = true;
}
}
if(!valid25){
const err26 = {instancePath,schemaPath:"#/allOf/8/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err26];
}
else {
vErrors.push(err26);
}
errors++;
}
if(props0 !== true && props8 !== undefined){
if(props8 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props8);
}
}
const _errs56 = errors;
let valid28 = true;
const _errs57 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing9;
if((data.type === undefined) && (missing9 = "type")){
const err27 = {};
if(vErrors === null){
vErrors = [err27];
}
else {
vErrors.push(err27);
}
errors++;
}
else {
if(data.type !== undefined){
if("series-recorded" !== data.type){
const err28 = {};
if(vErrors === null){
vErrors = [err28];
}
else {
vErrors.push(err28);
}
errors++;
}
}
}
}
var _valid9 = _errs57 === errors;
errors = _errs56;
if(vErrors !== null){
if(_errs56){
vErrors.length = _errs56;
}
else {
vErrors = null;
}
}
if(_valid9){
const _errs59 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate129(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate129.errors : vErrors.concat(validate129.errors);
errors = vErrors.length;
}
}
}
var _valid9 = _errs59 === errors;
valid28 = _valid9;
if(valid28){
var props9 = {};
props9.data = true;
props9.type = true;
}
}
if(!valid28){
const err29 = {instancePath,schemaPath:"#/allOf/9/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err29];
}
else {
vErrors.push(err29);
}
errors++;
}
if(props0 !== true && props9 !== undefined){
if(props9 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props9);
}
}
const _errs62 = errors;
let valid31 = true;
const _errs63 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing10;
if((data.type === undefined) && (missing10 = "type")){
const err30 = {};
if(vErrors === null){
vErrors = [err30];
}
else {
vErrors.push(err30);
}
errors++;
}
else {
if(data.type !== undefined){
if("mark-placed" !== data.type){
const err31 = {};
if(vErrors === null){
vErrors = [err31];
}
else {
vErrors.push(err31);
}
errors++;
}
}
}
}
var _valid10 = _errs63 === errors;
errors = _errs62;
if(vErrors !== null){
if(_errs62){
vErrors.length = _errs62;
}
else {
vErrors = null;
}
}
if(_valid10){
const _errs65 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate143(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
var _valid10 = _errs65 === errors;
valid31 = _valid10;
if(valid31){
var props10 = {};
props10.data = true;
props10.type = true;
}
}
if(!valid31){
const err32 = {instancePath,schemaPath:"#/allOf/10/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err32];
}
else {
vErrors.push(err32);
}
errors++;
}
if(props0 !== true && props10 !== undefined){
if(props10 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props10);
}
}
const _errs68 = errors;
let valid34 = true;
const _errs69 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing11;
if((data.type === undefined) && (missing11 = "type")){
const err33 = {};
if(vErrors === null){
vErrors = [err33];
}
else {
vErrors.push(err33);
}
errors++;
}
else {
if(data.type !== undefined){
if("codes-recorded" !== data.type){
const err34 = {};
if(vErrors === null){
vErrors = [err34];
}
else {
vErrors.push(err34);
}
errors++;
}
}
}
}
var _valid11 = _errs69 === errors;
errors = _errs68;
if(vErrors !== null){
if(_errs68){
vErrors.length = _errs68;
}
else {
vErrors = null;
}
}
if(_valid11){
const _errs71 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate147(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate147.errors : vErrors.concat(validate147.errors);
errors = vErrors.length;
}
}
}
var _valid11 = _errs71 === errors;
valid34 = _valid11;
if(valid34){
var props11 = {};
props11.data = true;
props11.type = true;
}
}
if(!valid34){
const err35 = {instancePath,schemaPath:"#/allOf/11/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err35];
}
else {
vErrors.push(err35);
}
errors++;
}
if(props0 !== true && props11 !== undefined){
if(props11 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props11);
}
}
const _errs74 = errors;
let valid37 = true;
const _errs75 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing12;
if((data.type === undefined) && (missing12 = "type")){
const err36 = {};
if(vErrors === null){
vErrors = [err36];
}
else {
vErrors.push(err36);
}
errors++;
}
else {
if(data.type !== undefined){
if("timer-started" !== data.type){
const err37 = {};
if(vErrors === null){
vErrors = [err37];
}
else {
vErrors.push(err37);
}
errors++;
}
}
}
}
var _valid12 = _errs75 === errors;
errors = _errs74;
if(vErrors !== null){
if(_errs74){
vErrors.length = _errs74;
}
else {
vErrors = null;
}
}
if(_valid12){
const _errs77 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate154(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate154.errors : vErrors.concat(validate154.errors);
errors = vErrors.length;
}
}
}
var _valid12 = _errs77 === errors;
valid37 = _valid12;
if(valid37){
var props12 = {};
props12.data = true;
props12.type = true;
}
}
if(!valid37){
const err38 = {instancePath,schemaPath:"#/allOf/12/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err38];
}
else {
vErrors.push(err38);
}
errors++;
}
if(props0 !== true && props12 !== undefined){
if(props12 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props12);
}
}
const _errs80 = errors;
let valid40 = true;
const _errs81 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing13;
if((data.type === undefined) && (missing13 = "type")){
const err39 = {};
if(vErrors === null){
vErrors = [err39];
}
else {
vErrors.push(err39);
}
errors++;
}
else {
if(data.type !== undefined){
if("timer-ended" !== data.type){
const err40 = {};
if(vErrors === null){
vErrors = [err40];
}
else {
vErrors.push(err40);
}
errors++;
}
}
}
}
var _valid13 = _errs81 === errors;
errors = _errs80;
if(vErrors !== null){
if(_errs80){
vErrors.length = _errs80;
}
else {
vErrors = null;
}
}
if(_valid13){
const _errs83 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate157(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate157.errors : vErrors.concat(validate157.errors);
errors = vErrors.length;
}
}
}
var _valid13 = _errs83 === errors;
valid40 = _valid13;
if(valid40){
var props13 = {};
props13.data = true;
props13.type = true;
}
}
if(!valid40){
const err41 = {instancePath,schemaPath:"#/allOf/13/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err41];
}
else {
vErrors.push(err41);
}
errors++;
}
if(props0 !== true && props13 !== undefined){
if(props13 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props13);
}
}
const _errs86 = errors;
let valid43 = true;
const _errs87 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing14;
if((data.type === undefined) && (missing14 = "type")){
const err42 = {};
if(vErrors === null){
vErrors = [err42];
}
else {
vErrors.push(err42);
}
errors++;
}
else {
if(data.type !== undefined){
if("choice-made" !== data.type){
const err43 = {};
if(vErrors === null){
vErrors = [err43];
}
else {
vErrors.push(err43);
}
errors++;
}
}
}
}
var _valid14 = _errs87 === errors;
errors = _errs86;
if(vErrors !== null){
if(_errs86){
vErrors.length = _errs86;
}
else {
vErrors = null;
}
}
if(_valid14){
const _errs89 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate160(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate160.errors : vErrors.concat(validate160.errors);
errors = vErrors.length;
}
}
}
var _valid14 = _errs89 === errors;
valid43 = _valid14;
if(valid43){
var props14 = {};
props14.data = true;
props14.type = true;
}
}
if(!valid43){
const err44 = {instancePath,schemaPath:"#/allOf/14/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err44];
}
else {
vErrors.push(err44);
}
errors++;
}
if(props0 !== true && props14 !== undefined){
if(props14 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props14);
}
}
const _errs92 = errors;
let valid46 = true;
const _errs93 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing15;
if((data.type === undefined) && (missing15 = "type")){
const err45 = {};
if(vErrors === null){
vErrors = [err45];
}
else {
vErrors.push(err45);
}
errors++;
}
else {
if(data.type !== undefined){
if("photo-attached" !== data.type){
const err46 = {};
if(vErrors === null){
vErrors = [err46];
}
else {
vErrors.push(err46);
}
errors++;
}
}
}
}
var _valid15 = _errs93 === errors;
errors = _errs92;
if(vErrors !== null){
if(_errs92){
vErrors.length = _errs92;
}
else {
vErrors = null;
}
}
if(_valid15){
const _errs95 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate166(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate166.errors : vErrors.concat(validate166.errors);
errors = vErrors.length;
}
}
}
var _valid15 = _errs95 === errors;
valid46 = _valid15;
if(valid46){
var props15 = {};
props15.data = true;
props15.type = true;
}
}
if(!valid46){
const err47 = {instancePath,schemaPath:"#/allOf/15/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err47];
}
else {
vErrors.push(err47);
}
errors++;
}
if(props0 !== true && props15 !== undefined){
if(props15 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props15);
}
}
const _errs98 = errors;
let valid49 = true;
const _errs99 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing16;
if((data.type === undefined) && (missing16 = "type")){
const err48 = {};
if(vErrors === null){
vErrors = [err48];
}
else {
vErrors.push(err48);
}
errors++;
}
else {
if(data.type !== undefined){
if("note-written" !== data.type){
const err49 = {};
if(vErrors === null){
vErrors = [err49];
}
else {
vErrors.push(err49);
}
errors++;
}
}
}
}
var _valid16 = _errs99 === errors;
errors = _errs98;
if(vErrors !== null){
if(_errs98){
vErrors.length = _errs98;
}
else {
vErrors = null;
}
}
if(_valid16){
const _errs101 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate171(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate171.errors : vErrors.concat(validate171.errors);
errors = vErrors.length;
}
}
}
var _valid16 = _errs101 === errors;
valid49 = _valid16;
if(valid49){
var props16 = {};
props16.data = true;
props16.type = true;
}
}
if(!valid49){
const err50 = {instancePath,schemaPath:"#/allOf/16/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err50];
}
else {
vErrors.push(err50);
}
errors++;
}
if(props0 !== true && props16 !== undefined){
if(props16 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props16);
}
}
const _errs104 = errors;
let valid52 = true;
const _errs105 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing17;
if((data.type === undefined) && (missing17 = "type")){
const err51 = {};
if(vErrors === null){
vErrors = [err51];
}
else {
vErrors.push(err51);
}
errors++;
}
else {
if(data.type !== undefined){
if("margin-note-written" !== data.type){
const err52 = {};
if(vErrors === null){
vErrors = [err52];
}
else {
vErrors.push(err52);
}
errors++;
}
}
}
}
var _valid17 = _errs105 === errors;
errors = _errs104;
if(vErrors !== null){
if(_errs104){
vErrors.length = _errs104;
}
else {
vErrors = null;
}
}
if(_valid17){
const _errs107 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate175(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate175.errors : vErrors.concat(validate175.errors);
errors = vErrors.length;
}
}
}
var _valid17 = _errs107 === errors;
valid52 = _valid17;
if(valid52){
var props17 = {};
props17.data = true;
props17.type = true;
}
}
if(!valid52){
const err53 = {instancePath,schemaPath:"#/allOf/17/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err53];
}
else {
vErrors.push(err53);
}
errors++;
}
if(props0 !== true && props17 !== undefined){
if(props17 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props17);
}
}
const _errs110 = errors;
let valid55 = true;
const _errs111 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing18;
if((data.type === undefined) && (missing18 = "type")){
const err54 = {};
if(vErrors === null){
vErrors = [err54];
}
else {
vErrors.push(err54);
}
errors++;
}
else {
if(data.type !== undefined){
if("disturbed" !== data.type){
const err55 = {};
if(vErrors === null){
vErrors = [err55];
}
else {
vErrors.push(err55);
}
errors++;
}
}
}
}
var _valid18 = _errs111 === errors;
errors = _errs110;
if(vErrors !== null){
if(_errs110){
vErrors.length = _errs110;
}
else {
vErrors = null;
}
}
if(_valid18){
const _errs113 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate179(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate179.errors : vErrors.concat(validate179.errors);
errors = vErrors.length;
}
}
}
var _valid18 = _errs113 === errors;
valid55 = _valid18;
if(valid55){
var props18 = {};
props18.data = true;
props18.type = true;
}
}
if(!valid55){
const err56 = {instancePath,schemaPath:"#/allOf/18/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err56];
}
else {
vErrors.push(err56);
}
errors++;
}
if(props0 !== true && props18 !== undefined){
if(props18 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props18);
}
}
const _errs116 = errors;
let valid58 = true;
const _errs117 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing19;
if((data.type === undefined) && (missing19 = "type")){
const err57 = {};
if(vErrors === null){
vErrors = [err57];
}
else {
vErrors.push(err57);
}
errors++;
}
else {
if(data.type !== undefined){
if("restored" !== data.type){
const err58 = {};
if(vErrors === null){
vErrors = [err58];
}
else {
vErrors.push(err58);
}
errors++;
}
}
}
}
var _valid19 = _errs117 === errors;
errors = _errs116;
if(vErrors !== null){
if(_errs116){
vErrors.length = _errs116;
}
else {
vErrors = null;
}
}
if(_valid19){
const _errs119 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate184(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate184.errors : vErrors.concat(validate184.errors);
errors = vErrors.length;
}
}
}
var _valid19 = _errs119 === errors;
valid58 = _valid19;
if(valid58){
var props19 = {};
props19.data = true;
props19.type = true;
}
}
if(!valid58){
const err59 = {instancePath,schemaPath:"#/allOf/19/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err59];
}
else {
vErrors.push(err59);
}
errors++;
}
if(props0 !== true && props19 !== undefined){
if(props19 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props19);
}
}
const _errs122 = errors;
let valid61 = true;
const _errs123 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing20;
if((data.type === undefined) && (missing20 = "type")){
const err60 = {};
if(vErrors === null){
vErrors = [err60];
}
else {
vErrors.push(err60);
}
errors++;
}
else {
if(data.type !== undefined){
if("branch-taken" !== data.type){
const err61 = {};
if(vErrors === null){
vErrors = [err61];
}
else {
vErrors.push(err61);
}
errors++;
}
}
}
}
var _valid20 = _errs123 === errors;
errors = _errs122;
if(vErrors !== null){
if(_errs122){
vErrors.length = _errs122;
}
else {
vErrors = null;
}
}
if(_valid20){
const _errs125 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate188(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate188.errors : vErrors.concat(validate188.errors);
errors = vErrors.length;
}
}
}
var _valid20 = _errs125 === errors;
valid61 = _valid20;
if(valid61){
var props20 = {};
props20.data = true;
props20.type = true;
}
}
if(!valid61){
const err62 = {instancePath,schemaPath:"#/allOf/20/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err62];
}
else {
vErrors.push(err62);
}
errors++;
}
if(props0 !== true && props20 !== undefined){
if(props20 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props20);
}
}
const _errs128 = errors;
let valid64 = true;
const _errs129 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing21;
if((data.type === undefined) && (missing21 = "type")){
const err63 = {};
if(vErrors === null){
vErrors = [err63];
}
else {
vErrors.push(err63);
}
errors++;
}
else {
if(data.type !== undefined){
if("branch-overruled" !== data.type){
const err64 = {};
if(vErrors === null){
vErrors = [err64];
}
else {
vErrors.push(err64);
}
errors++;
}
}
}
}
var _valid21 = _errs129 === errors;
errors = _errs128;
if(vErrors !== null){
if(_errs128){
vErrors.length = _errs128;
}
else {
vErrors = null;
}
}
if(_valid21){
const _errs131 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate201(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate201.errors : vErrors.concat(validate201.errors);
errors = vErrors.length;
}
}
}
var _valid21 = _errs131 === errors;
valid64 = _valid21;
if(valid64){
var props21 = {};
props21.data = true;
props21.type = true;
}
}
if(!valid64){
const err65 = {instancePath,schemaPath:"#/allOf/21/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err65];
}
else {
vErrors.push(err65);
}
errors++;
}
if(props0 !== true && props21 !== undefined){
if(props21 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props21);
}
}
const _errs134 = errors;
let valid67 = true;
const _errs135 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing22;
if((data.type === undefined) && (missing22 = "type")){
const err66 = {};
if(vErrors === null){
vErrors = [err66];
}
else {
vErrors.push(err66);
}
errors++;
}
else {
if(data.type !== undefined){
if("step-redone" !== data.type){
const err67 = {};
if(vErrors === null){
vErrors = [err67];
}
else {
vErrors.push(err67);
}
errors++;
}
}
}
}
var _valid22 = _errs135 === errors;
errors = _errs134;
if(vErrors !== null){
if(_errs134){
vErrors.length = _errs134;
}
else {
vErrors = null;
}
}
if(_valid22){
const _errs137 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate207(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate207.errors : vErrors.concat(validate207.errors);
errors = vErrors.length;
}
}
}
var _valid22 = _errs137 === errors;
valid67 = _valid22;
if(valid67){
var props22 = {};
props22.data = true;
props22.type = true;
}
}
if(!valid67){
const err68 = {instancePath,schemaPath:"#/allOf/22/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err68];
}
else {
vErrors.push(err68);
}
errors++;
}
if(props0 !== true && props22 !== undefined){
if(props22 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props22);
}
}
const _errs140 = errors;
let valid70 = true;
const _errs141 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing23;
if((data.type === undefined) && (missing23 = "type")){
const err69 = {};
if(vErrors === null){
vErrors = [err69];
}
else {
vErrors.push(err69);
}
errors++;
}
else {
if(data.type !== undefined){
if("undone" !== data.type){
const err70 = {};
if(vErrors === null){
vErrors = [err70];
}
else {
vErrors.push(err70);
}
errors++;
}
}
}
}
var _valid23 = _errs141 === errors;
errors = _errs140;
if(vErrors !== null){
if(_errs140){
vErrors.length = _errs140;
}
else {
vErrors = null;
}
}
if(_valid23){
const _errs143 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate211(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate211.errors : vErrors.concat(validate211.errors);
errors = vErrors.length;
}
}
}
var _valid23 = _errs143 === errors;
valid70 = _valid23;
if(valid70){
var props23 = {};
props23.data = true;
props23.type = true;
}
}
if(!valid70){
const err71 = {instancePath,schemaPath:"#/allOf/23/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err71];
}
else {
vErrors.push(err71);
}
errors++;
}
if(props0 !== true && props23 !== undefined){
if(props23 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props23);
}
}
const _errs146 = errors;
let valid73 = true;
const _errs147 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing24;
if((data.type === undefined) && (missing24 = "type")){
const err72 = {};
if(vErrors === null){
vErrors = [err72];
}
else {
vErrors.push(err72);
}
errors++;
}
else {
if(data.type !== undefined){
if("lead-called" !== data.type){
const err73 = {};
if(vErrors === null){
vErrors = [err73];
}
else {
vErrors.push(err73);
}
errors++;
}
}
}
}
var _valid24 = _errs147 === errors;
errors = _errs146;
if(vErrors !== null){
if(_errs146){
vErrors.length = _errs146;
}
else {
vErrors = null;
}
}
if(_valid24){
const _errs149 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate216(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate216.errors : vErrors.concat(validate216.errors);
errors = vErrors.length;
}
}
}
var _valid24 = _errs149 === errors;
valid73 = _valid24;
if(valid73){
var props24 = {};
props24.data = true;
props24.type = true;
}
}
if(!valid73){
const err74 = {instancePath,schemaPath:"#/allOf/24/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err74];
}
else {
vErrors.push(err74);
}
errors++;
}
if(props0 !== true && props24 !== undefined){
if(props24 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props24);
}
}
const _errs152 = errors;
let valid76 = true;
const _errs153 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing25;
if((data.type === undefined) && (missing25 = "type")){
const err75 = {};
if(vErrors === null){
vErrors = [err75];
}
else {
vErrors.push(err75);
}
errors++;
}
else {
if(data.type !== undefined){
if("released" !== data.type){
const err76 = {};
if(vErrors === null){
vErrors = [err76];
}
else {
vErrors.push(err76);
}
errors++;
}
}
}
}
var _valid25 = _errs153 === errors;
errors = _errs152;
if(vErrors !== null){
if(_errs152){
vErrors.length = _errs152;
}
else {
vErrors = null;
}
}
if(_valid25){
const _errs155 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate220(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate220.errors : vErrors.concat(validate220.errors);
errors = vErrors.length;
}
}
}
var _valid25 = _errs155 === errors;
valid76 = _valid25;
if(valid76){
var props25 = {};
props25.data = true;
props25.type = true;
}
}
if(!valid76){
const err77 = {instancePath,schemaPath:"#/allOf/25/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err77];
}
else {
vErrors.push(err77);
}
errors++;
}
if(props0 !== true && props25 !== undefined){
if(props25 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props25);
}
}
const _errs158 = errors;
let valid79 = true;
const _errs159 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing26;
if((data.type === undefined) && (missing26 = "type")){
const err78 = {};
if(vErrors === null){
vErrors = [err78];
}
else {
vErrors.push(err78);
}
errors++;
}
else {
if(data.type !== undefined){
if("set-aside" !== data.type){
const err79 = {};
if(vErrors === null){
vErrors = [err79];
}
else {
vErrors.push(err79);
}
errors++;
}
}
}
}
var _valid26 = _errs159 === errors;
errors = _errs158;
if(vErrors !== null){
if(_errs158){
vErrors.length = _errs158;
}
else {
vErrors = null;
}
}
if(_valid26){
const _errs161 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate224(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate224.errors : vErrors.concat(validate224.errors);
errors = vErrors.length;
}
}
}
var _valid26 = _errs161 === errors;
valid79 = _valid26;
if(valid79){
var props26 = {};
props26.data = true;
props26.type = true;
}
}
if(!valid79){
const err80 = {instancePath,schemaPath:"#/allOf/26/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err80];
}
else {
vErrors.push(err80);
}
errors++;
}
if(props0 !== true && props26 !== undefined){
if(props26 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props26);
}
}
const _errs164 = errors;
let valid82 = true;
const _errs165 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing27;
if((data.type === undefined) && (missing27 = "type")){
const err81 = {};
if(vErrors === null){
vErrors = [err81];
}
else {
vErrors.push(err81);
}
errors++;
}
else {
if(data.type !== undefined){
if("resumed" !== data.type){
const err82 = {};
if(vErrors === null){
vErrors = [err82];
}
else {
vErrors.push(err82);
}
errors++;
}
}
}
}
var _valid27 = _errs165 === errors;
errors = _errs164;
if(vErrors !== null){
if(_errs164){
vErrors.length = _errs164;
}
else {
vErrors = null;
}
}
if(_valid27){
const _errs167 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate227(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate227.errors : vErrors.concat(validate227.errors);
errors = vErrors.length;
}
}
}
var _valid27 = _errs167 === errors;
valid82 = _valid27;
if(valid82){
var props27 = {};
props27.data = true;
props27.type = true;
}
}
if(!valid82){
const err83 = {instancePath,schemaPath:"#/allOf/27/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err83];
}
else {
vErrors.push(err83);
}
errors++;
}
if(props0 !== true && props27 !== undefined){
if(props27 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props27);
}
}
const _errs170 = errors;
let valid85 = true;
const _errs171 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing28;
if((data.type === undefined) && (missing28 = "type")){
const err84 = {};
if(vErrors === null){
vErrors = [err84];
}
else {
vErrors.push(err84);
}
errors++;
}
else {
if(data.type !== undefined){
if("handed-over" !== data.type){
const err85 = {};
if(vErrors === null){
vErrors = [err85];
}
else {
vErrors.push(err85);
}
errors++;
}
}
}
}
var _valid28 = _errs171 === errors;
errors = _errs170;
if(vErrors !== null){
if(_errs170){
vErrors.length = _errs170;
}
else {
vErrors = null;
}
}
if(_valid28){
const _errs173 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate230(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate230.errors : vErrors.concat(validate230.errors);
errors = vErrors.length;
}
}
}
var _valid28 = _errs173 === errors;
valid85 = _valid28;
if(valid85){
var props28 = {};
props28.data = true;
props28.type = true;
}
}
if(!valid85){
const err86 = {instancePath,schemaPath:"#/allOf/28/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err86];
}
else {
vErrors.push(err86);
}
errors++;
}
if(props0 !== true && props28 !== undefined){
if(props28 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props28);
}
}
const _errs176 = errors;
let valid88 = true;
const _errs177 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing29;
if((data.type === undefined) && (missing29 = "type")){
const err87 = {};
if(vErrors === null){
vErrors = [err87];
}
else {
vErrors.push(err87);
}
errors++;
}
else {
if(data.type !== undefined){
if("limit-exceeded" !== data.type){
const err88 = {};
if(vErrors === null){
vErrors = [err88];
}
else {
vErrors.push(err88);
}
errors++;
}
}
}
}
var _valid29 = _errs177 === errors;
errors = _errs176;
if(vErrors !== null){
if(_errs176){
vErrors.length = _errs176;
}
else {
vErrors = null;
}
}
if(_valid29){
const _errs179 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate234(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate234.errors : vErrors.concat(validate234.errors);
errors = vErrors.length;
}
}
}
var _valid29 = _errs179 === errors;
valid88 = _valid29;
if(valid88){
var props29 = {};
props29.data = true;
props29.type = true;
}
}
if(!valid88){
const err89 = {instancePath,schemaPath:"#/allOf/29/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err89];
}
else {
vErrors.push(err89);
}
errors++;
}
if(props0 !== true && props29 !== undefined){
if(props29 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props29);
}
}
const _errs182 = errors;
let valid91 = true;
const _errs183 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing30;
if((data.type === undefined) && (missing30 = "type")){
const err90 = {};
if(vErrors === null){
vErrors = [err90];
}
else {
vErrors.push(err90);
}
errors++;
}
else {
if(data.type !== undefined){
if("alert-raised" !== data.type){
const err91 = {};
if(vErrors === null){
vErrors = [err91];
}
else {
vErrors.push(err91);
}
errors++;
}
}
}
}
var _valid30 = _errs183 === errors;
errors = _errs182;
if(vErrors !== null){
if(_errs182){
vErrors.length = _errs182;
}
else {
vErrors = null;
}
}
if(_valid30){
const _errs185 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate240(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate240.errors : vErrors.concat(validate240.errors);
errors = vErrors.length;
}
}
}
var _valid30 = _errs185 === errors;
valid91 = _valid30;
if(valid91){
var props30 = {};
props30.data = true;
props30.type = true;
}
}
if(!valid91){
const err92 = {instancePath,schemaPath:"#/allOf/30/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err92];
}
else {
vErrors.push(err92);
}
errors++;
}
if(props0 !== true && props30 !== undefined){
if(props30 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props30);
}
}
const _errs188 = errors;
let valid94 = true;
const _errs189 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing31;
if((data.type === undefined) && (missing31 = "type")){
const err93 = {};
if(vErrors === null){
vErrors = [err93];
}
else {
vErrors.push(err93);
}
errors++;
}
else {
if(data.type !== undefined){
if("alert-acknowledged" !== data.type){
const err94 = {};
if(vErrors === null){
vErrors = [err94];
}
else {
vErrors.push(err94);
}
errors++;
}
}
}
}
var _valid31 = _errs189 === errors;
errors = _errs188;
if(vErrors !== null){
if(_errs188){
vErrors.length = _errs188;
}
else {
vErrors = null;
}
}
if(_valid31){
const _errs191 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate244(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate244.errors : vErrors.concat(validate244.errors);
errors = vErrors.length;
}
}
}
var _valid31 = _errs191 === errors;
valid94 = _valid31;
if(valid94){
var props31 = {};
props31.data = true;
props31.type = true;
}
}
if(!valid94){
const err95 = {instancePath,schemaPath:"#/allOf/31/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err95];
}
else {
vErrors.push(err95);
}
errors++;
}
if(props0 !== true && props31 !== undefined){
if(props31 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props31);
}
}
const _errs194 = errors;
let valid97 = true;
const _errs195 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing32;
if((data.type === undefined) && (missing32 = "type")){
const err96 = {};
if(vErrors === null){
vErrors = [err96];
}
else {
vErrors.push(err96);
}
errors++;
}
else {
if(data.type !== undefined){
if("stopped" !== data.type){
const err97 = {};
if(vErrors === null){
vErrors = [err97];
}
else {
vErrors.push(err97);
}
errors++;
}
}
}
}
var _valid32 = _errs195 === errors;
errors = _errs194;
if(vErrors !== null){
if(_errs194){
vErrors.length = _errs194;
}
else {
vErrors = null;
}
}
if(_valid32){
const _errs197 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate247(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate247.errors : vErrors.concat(validate247.errors);
errors = vErrors.length;
}
}
}
var _valid32 = _errs197 === errors;
valid97 = _valid32;
if(valid97){
var props32 = {};
props32.data = true;
props32.type = true;
}
}
if(!valid97){
const err98 = {instancePath,schemaPath:"#/allOf/32/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err98];
}
else {
vErrors.push(err98);
}
errors++;
}
if(props0 !== true && props32 !== undefined){
if(props32 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props32);
}
}
const _errs200 = errors;
let valid100 = true;
const _errs201 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing33;
if((data.type === undefined) && (missing33 = "type")){
const err99 = {};
if(vErrors === null){
vErrors = [err99];
}
else {
vErrors.push(err99);
}
errors++;
}
else {
if(data.type !== undefined){
if("version-notice-answered" !== data.type){
const err100 = {};
if(vErrors === null){
vErrors = [err100];
}
else {
vErrors.push(err100);
}
errors++;
}
}
}
}
var _valid33 = _errs201 === errors;
errors = _errs200;
if(vErrors !== null){
if(_errs200){
vErrors.length = _errs200;
}
else {
vErrors = null;
}
}
if(_valid33){
const _errs203 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate251(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate251.errors : vErrors.concat(validate251.errors);
errors = vErrors.length;
}
}
}
var _valid33 = _errs203 === errors;
valid100 = _valid33;
if(valid100){
var props33 = {};
props33.data = true;
props33.type = true;
}
}
if(!valid100){
const err101 = {instancePath,schemaPath:"#/allOf/33/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err101];
}
else {
vErrors.push(err101);
}
errors++;
}
if(props0 !== true && props33 !== undefined){
if(props33 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props33);
}
}
const _errs206 = errors;
let valid103 = true;
const _errs207 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing34;
if((data.type === undefined) && (missing34 = "type")){
const err102 = {};
if(vErrors === null){
vErrors = [err102];
}
else {
vErrors.push(err102);
}
errors++;
}
else {
if(data.type !== undefined){
if("finding-reached" !== data.type){
const err103 = {};
if(vErrors === null){
vErrors = [err103];
}
else {
vErrors.push(err103);
}
errors++;
}
}
}
}
var _valid34 = _errs207 === errors;
errors = _errs206;
if(vErrors !== null){
if(_errs206){
vErrors.length = _errs206;
}
else {
vErrors = null;
}
}
if(_valid34){
const _errs209 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate254(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate254.errors : vErrors.concat(validate254.errors);
errors = vErrors.length;
}
}
}
var _valid34 = _errs209 === errors;
valid103 = _valid34;
if(valid103){
var props34 = {};
props34.data = true;
props34.type = true;
}
}
if(!valid103){
const err104 = {instancePath,schemaPath:"#/allOf/34/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err104];
}
else {
vErrors.push(err104);
}
errors++;
}
if(props0 !== true && props34 !== undefined){
if(props34 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props34);
}
}
const _errs212 = errors;
let valid106 = true;
const _errs213 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing35;
if((data.type === undefined) && (missing35 = "type")){
const err105 = {};
if(vErrors === null){
vErrors = [err105];
}
else {
vErrors.push(err105);
}
errors++;
}
else {
if(data.type !== undefined){
if("write-up-written" !== data.type){
const err106 = {};
if(vErrors === null){
vErrors = [err106];
}
else {
vErrors.push(err106);
}
errors++;
}
}
}
}
var _valid35 = _errs213 === errors;
errors = _errs212;
if(vErrors !== null){
if(_errs212){
vErrors.length = _errs212;
}
else {
vErrors = null;
}
}
if(_valid35){
const _errs215 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate258(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate258.errors : vErrors.concat(validate258.errors);
errors = vErrors.length;
}
}
}
var _valid35 = _errs215 === errors;
valid106 = _valid35;
if(valid106){
var props35 = {};
props35.data = true;
props35.type = true;
}
}
if(!valid106){
const err107 = {instancePath,schemaPath:"#/allOf/35/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err107];
}
else {
vErrors.push(err107);
}
errors++;
}
if(props0 !== true && props35 !== undefined){
if(props35 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props35);
}
}
const _errs218 = errors;
let valid109 = true;
const _errs219 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing36;
if((data.type === undefined) && (missing36 = "type")){
const err108 = {};
if(vErrors === null){
vErrors = [err108];
}
else {
vErrors.push(err108);
}
errors++;
}
else {
if(data.type !== undefined){
if("closed" !== data.type){
const err109 = {};
if(vErrors === null){
vErrors = [err109];
}
else {
vErrors.push(err109);
}
errors++;
}
}
}
}
var _valid36 = _errs219 === errors;
errors = _errs218;
if(vErrors !== null){
if(_errs218){
vErrors.length = _errs218;
}
else {
vErrors = null;
}
}
if(_valid36){
const _errs221 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate265(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate265.errors : vErrors.concat(validate265.errors);
errors = vErrors.length;
}
}
}
var _valid36 = _errs221 === errors;
valid109 = _valid36;
if(valid109){
var props36 = {};
props36.data = true;
props36.type = true;
}
}
if(!valid109){
const err110 = {instancePath,schemaPath:"#/allOf/36/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err110];
}
else {
vErrors.push(err110);
}
errors++;
}
if(props0 !== true && props36 !== undefined){
if(props36 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props36);
}
}
const _errs224 = errors;
let valid112 = true;
const _errs225 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing37;
if((data.type === undefined) && (missing37 = "type")){
const err111 = {};
if(vErrors === null){
vErrors = [err111];
}
else {
vErrors.push(err111);
}
errors++;
}
else {
if(data.type !== undefined){
if("verified" !== data.type){
const err112 = {};
if(vErrors === null){
vErrors = [err112];
}
else {
vErrors.push(err112);
}
errors++;
}
}
}
}
var _valid37 = _errs225 === errors;
errors = _errs224;
if(vErrors !== null){
if(_errs224){
vErrors.length = _errs224;
}
else {
vErrors = null;
}
}
if(_valid37){
const _errs227 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate268(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate268.errors : vErrors.concat(validate268.errors);
errors = vErrors.length;
}
}
}
var _valid37 = _errs227 === errors;
valid112 = _valid37;
if(valid112){
var props37 = {};
props37.data = true;
props37.type = true;
}
}
if(!valid112){
const err113 = {instancePath,schemaPath:"#/allOf/37/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err113];
}
else {
vErrors.push(err113);
}
errors++;
}
if(props0 !== true && props37 !== undefined){
if(props37 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props37);
}
}
const _errs230 = errors;
let valid115 = true;
const _errs231 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing38;
if((data.type === undefined) && (missing38 = "type")){
const err114 = {};
if(vErrors === null){
vErrors = [err114];
}
else {
vErrors.push(err114);
}
errors++;
}
else {
if(data.type !== undefined){
if("signed" !== data.type){
const err115 = {};
if(vErrors === null){
vErrors = [err115];
}
else {
vErrors.push(err115);
}
errors++;
}
}
}
}
var _valid38 = _errs231 === errors;
errors = _errs230;
if(vErrors !== null){
if(_errs230){
vErrors.length = _errs230;
}
else {
vErrors = null;
}
}
if(_valid38){
const _errs233 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate272(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate272.errors : vErrors.concat(validate272.errors);
errors = vErrors.length;
}
}
}
var _valid38 = _errs233 === errors;
valid115 = _valid38;
if(valid115){
var props38 = {};
props38.data = true;
props38.type = true;
}
}
if(!valid115){
const err116 = {instancePath,schemaPath:"#/allOf/38/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err116];
}
else {
vErrors.push(err116);
}
errors++;
}
if(props0 !== true && props38 !== undefined){
if(props38 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props38);
}
}
const _errs236 = errors;
let valid118 = true;
const _errs237 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing39;
if((data.type === undefined) && (missing39 = "type")){
const err117 = {};
if(vErrors === null){
vErrors = [err117];
}
else {
vErrors.push(err117);
}
errors++;
}
else {
if(data.type !== undefined){
if("amended" !== data.type){
const err118 = {};
if(vErrors === null){
vErrors = [err118];
}
else {
vErrors.push(err118);
}
errors++;
}
}
}
}
var _valid39 = _errs237 === errors;
errors = _errs236;
if(vErrors !== null){
if(_errs236){
vErrors.length = _errs236;
}
else {
vErrors = null;
}
}
if(_valid39){
const _errs239 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate275(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate275.errors : vErrors.concat(validate275.errors);
errors = vErrors.length;
}
}
}
var _valid39 = _errs239 === errors;
valid118 = _valid39;
if(valid118){
var props39 = {};
props39.data = true;
props39.type = true;
}
}
if(!valid118){
const err119 = {instancePath,schemaPath:"#/allOf/39/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err119];
}
else {
vErrors.push(err119);
}
errors++;
}
if(props0 !== true && props39 !== undefined){
if(props39 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props39);
}
}
const _errs242 = errors;
let valid121 = true;
const _errs243 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing40;
if((data.type === undefined) && (missing40 = "type")){
const err120 = {};
if(vErrors === null){
vErrors = [err120];
}
else {
vErrors.push(err120);
}
errors++;
}
else {
if(data.type !== undefined){
if("joined" !== data.type){
const err121 = {};
if(vErrors === null){
vErrors = [err121];
}
else {
vErrors.push(err121);
}
errors++;
}
}
}
}
var _valid40 = _errs243 === errors;
errors = _errs242;
if(vErrors !== null){
if(_errs242){
vErrors.length = _errs242;
}
else {
vErrors = null;
}
}
if(_valid40){
const _errs245 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate279(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate279.errors : vErrors.concat(validate279.errors);
errors = vErrors.length;
}
}
}
var _valid40 = _errs245 === errors;
valid121 = _valid40;
if(valid121){
var props40 = {};
props40.data = true;
props40.type = true;
}
}
if(!valid121){
const err122 = {instancePath,schemaPath:"#/allOf/40/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err122];
}
else {
vErrors.push(err122);
}
errors++;
}
if(props0 !== true && props40 !== undefined){
if(props40 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props40);
}
}
const _errs248 = errors;
let valid124 = true;
const _errs249 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing41;
if((data.type === undefined) && (missing41 = "type")){
const err123 = {};
if(vErrors === null){
vErrors = [err123];
}
else {
vErrors.push(err123);
}
errors++;
}
else {
if(data.type !== undefined){
if("clock-jumped" !== data.type){
const err124 = {};
if(vErrors === null){
vErrors = [err124];
}
else {
vErrors.push(err124);
}
errors++;
}
}
}
}
var _valid41 = _errs249 === errors;
errors = _errs248;
if(vErrors !== null){
if(_errs248){
vErrors.length = _errs248;
}
else {
vErrors = null;
}
}
if(_valid41){
const _errs251 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate283(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate283.errors : vErrors.concat(validate283.errors);
errors = vErrors.length;
}
}
}
var _valid41 = _errs251 === errors;
valid124 = _valid41;
if(valid124){
var props41 = {};
props41.data = true;
props41.type = true;
}
}
if(!valid124){
const err125 = {instancePath,schemaPath:"#/allOf/41/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err125];
}
else {
vErrors.push(err125);
}
errors++;
}
if(props0 !== true && props41 !== undefined){
if(props41 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props41);
}
}
const _errs254 = errors;
let valid127 = true;
const _errs255 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
let missing42;
if((data.type === undefined) && (missing42 = "type")){
const err126 = {};
if(vErrors === null){
vErrors = [err126];
}
else {
vErrors.push(err126);
}
errors++;
}
else {
if(data.type !== undefined){
if("transcribed" !== data.type){
const err127 = {};
if(vErrors === null){
vErrors = [err127];
}
else {
vErrors.push(err127);
}
errors++;
}
}
}
}
var _valid42 = _errs255 === errors;
errors = _errs254;
if(vErrors !== null){
if(_errs254){
vErrors.length = _errs254;
}
else {
vErrors = null;
}
}
if(_valid42){
const _errs257 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.data !== undefined){
if(!(validate285(data.data, {instancePath:instancePath+"/data",parentData:data,parentDataProperty:"data",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate285.errors : vErrors.concat(validate285.errors);
errors = vErrors.length;
}
}
}
var _valid42 = _errs257 === errors;
valid127 = _valid42;
if(valid127){
var props42 = {};
props42.data = true;
props42.type = true;
}
}
if(!valid127){
const err128 = {instancePath,schemaPath:"#/allOf/42/if",keyword:"if",params:{failingKeyword: "then"},message:"must match \"then\" schema"};
if(vErrors === null){
vErrors = [err128];
}
else {
vErrors.push(err128);
}
errors++;
}
if(props0 !== true && props42 !== undefined){
if(props42 === true){
props0 = true;
}
else {
props0 = props0 || {};
Object.assign(props0, props42);
}
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.runId === undefined){
const err129 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "runId"},message:"must have required property '"+"runId"+"'"};
if(vErrors === null){
vErrors = [err129];
}
else {
vErrors.push(err129);
}
errors++;
}
if(data.seq === undefined){
const err130 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "seq"},message:"must have required property '"+"seq"+"'"};
if(vErrors === null){
vErrors = [err130];
}
else {
vErrors.push(err130);
}
errors++;
}
if(data.id === undefined){
const err131 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err131];
}
else {
vErrors.push(err131);
}
errors++;
}
if(data.at === undefined){
const err132 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "at"},message:"must have required property '"+"at"+"'"};
if(vErrors === null){
vErrors = [err132];
}
else {
vErrors.push(err132);
}
errors++;
}
if(data.elapsed === undefined){
const err133 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "elapsed"},message:"must have required property '"+"elapsed"+"'"};
if(vErrors === null){
vErrors = [err133];
}
else {
vErrors.push(err133);
}
errors++;
}
if(data.actor === undefined){
const err134 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "actor"},message:"must have required property '"+"actor"+"'"};
if(vErrors === null){
vErrors = [err134];
}
else {
vErrors.push(err134);
}
errors++;
}
if(data.device === undefined){
const err135 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "device"},message:"must have required property '"+"device"+"'"};
if(vErrors === null){
vErrors = [err135];
}
else {
vErrors.push(err135);
}
errors++;
}
if(data.build === undefined){
const err136 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "build"},message:"must have required property '"+"build"+"'"};
if(vErrors === null){
vErrors = [err136];
}
else {
vErrors.push(err136);
}
errors++;
}
if(data.schema === undefined){
const err137 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "schema"},message:"must have required property '"+"schema"+"'"};
if(vErrors === null){
vErrors = [err137];
}
else {
vErrors.push(err137);
}
errors++;
}
if(data.prev === undefined){
const err138 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "prev"},message:"must have required property '"+"prev"+"'"};
if(vErrors === null){
vErrors = [err138];
}
else {
vErrors.push(err138);
}
errors++;
}
if(data.hash === undefined){
const err139 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "hash"},message:"must have required property '"+"hash"+"'"};
if(vErrors === null){
vErrors = [err139];
}
else {
vErrors.push(err139);
}
errors++;
}
if(data.type === undefined){
const err140 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "type"},message:"must have required property '"+"type"+"'"};
if(vErrors === null){
vErrors = [err140];
}
else {
vErrors.push(err140);
}
errors++;
}
if(data.data === undefined){
const err141 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "data"},message:"must have required property '"+"data"+"'"};
if(vErrors === null){
vErrors = [err141];
}
else {
vErrors.push(err141);
}
errors++;
}
for(const key0 in data){
if(!(func11.call(schema19.properties, key0))){
const err142 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err142];
}
else {
vErrors.push(err142);
}
errors++;
}
}
if(data.runId !== undefined){
if(!(validate79(data.runId, {instancePath:instancePath+"/runId",parentData:data,parentDataProperty:"runId",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate79.errors : vErrors.concat(validate79.errors);
errors = vErrors.length;
}
}
if(data.seq !== undefined){
if(!(validate212(data.seq, {instancePath:instancePath+"/seq",parentData:data,parentDataProperty:"seq",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate212.errors : vErrors.concat(validate212.errors);
errors = vErrors.length;
}
}
if(data.id !== undefined){
if(!(validate290(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate290.errors : vErrors.concat(validate290.errors);
errors = vErrors.length;
}
}
if(data.at !== undefined){
if(!(validate134(data.at, {instancePath:instancePath+"/at",parentData:data,parentDataProperty:"at",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate134.errors : vErrors.concat(validate134.errors);
errors = vErrors.length;
}
}
if(data.elapsed !== undefined){
let data90 = data.elapsed;
if((typeof data90 == "number") && (isFinite(data90))){
if(data90 > 9007199254740991 || isNaN(data90)){
const err143 = {instancePath:instancePath+"/elapsed",schemaPath:"#/properties/elapsed/maximum",keyword:"maximum",params:{comparison: "<=", limit: 9007199254740991},message:"must be <= 9007199254740991"};
if(vErrors === null){
vErrors = [err143];
}
else {
vErrors.push(err143);
}
errors++;
}
if(data90 < 0 || isNaN(data90)){
const err144 = {instancePath:instancePath+"/elapsed",schemaPath:"#/properties/elapsed/minimum",keyword:"minimum",params:{comparison: ">=", limit: 0},message:"must be >= 0"};
if(vErrors === null){
vErrors = [err144];
}
else {
vErrors.push(err144);
}
errors++;
}
}
else {
const err145 = {instancePath:instancePath+"/elapsed",schemaPath:"#/properties/elapsed/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err145];
}
else {
vErrors.push(err145);
}
errors++;
}
}
if(data.actor !== undefined){
if(!(validate84(data.actor, {instancePath:instancePath+"/actor",parentData:data,parentDataProperty:"actor",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.device !== undefined){
if(!(validate84(data.device, {instancePath:instancePath+"/device",parentData:data,parentDataProperty:"device",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.build !== undefined){
if(!(validate84(data.build, {instancePath:instancePath+"/build",parentData:data,parentDataProperty:"build",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.schema !== undefined){
if(1 !== data.schema){
const err146 = {instancePath:instancePath+"/schema",schemaPath:"#/properties/schema/const",keyword:"const",params:{allowedValue: 1},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err146];
}
else {
vErrors.push(err146);
}
errors++;
}
}
if(data.prev !== undefined){
if(!(validate132(data.prev, {instancePath:instancePath+"/prev",parentData:data,parentDataProperty:"prev",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate132.errors : vErrors.concat(validate132.errors);
errors = vErrors.length;
}
}
if(data.hash !== undefined){
if(!(validate132(data.hash, {instancePath:instancePath+"/hash",parentData:data,parentDataProperty:"hash",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate132.errors : vErrors.concat(validate132.errors);
errors = vErrors.length;
}
}
if(data.type !== undefined){
let data97 = data.type;
if(!(((((((((((((((((((((((((((((((((((((((((((data97 === "opened") || (data97 === "gear-chosen")) || (data97 === "step-claimed")) || (data97 === "step-done")) || (data97 === "caution-acknowledged")) || (data97 === "reading-recorded")) || (data97 === "not-measurable")) || (data97 === "not-applicable")) || (data97 === "predicted")) || (data97 === "series-recorded")) || (data97 === "mark-placed")) || (data97 === "codes-recorded")) || (data97 === "timer-started")) || (data97 === "timer-ended")) || (data97 === "choice-made")) || (data97 === "photo-attached")) || (data97 === "note-written")) || (data97 === "margin-note-written")) || (data97 === "disturbed")) || (data97 === "restored")) || (data97 === "branch-taken")) || (data97 === "branch-overruled")) || (data97 === "step-redone")) || (data97 === "undone")) || (data97 === "lead-called")) || (data97 === "released")) || (data97 === "set-aside")) || (data97 === "resumed")) || (data97 === "handed-over")) || (data97 === "limit-exceeded")) || (data97 === "alert-raised")) || (data97 === "alert-acknowledged")) || (data97 === "stopped")) || (data97 === "version-notice-answered")) || (data97 === "finding-reached")) || (data97 === "write-up-written")) || (data97 === "closed")) || (data97 === "verified")) || (data97 === "signed")) || (data97 === "amended")) || (data97 === "joined")) || (data97 === "clock-jumped")) || (data97 === "transcribed"))){
const err147 = {instancePath:instancePath+"/type",schemaPath:"#/properties/type/enum",keyword:"enum",params:{allowedValues: schema19.properties.type.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err147];
}
else {
vErrors.push(err147);
}
errors++;
}
}
if(data.data !== undefined){
let data98 = data.data;
if(!(data98 && typeof data98 == "object" && !Array.isArray(data98))){
const err148 = {instancePath:instancePath+"/data",schemaPath:"#/properties/data/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err148];
}
else {
vErrors.push(err148);
}
errors++;
}
}
}
else {
const err149 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err149];
}
else {
vErrors.push(err149);
}
errors++;
}
validate52.errors = vErrors;
return errors === 0;
}
validate52.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

